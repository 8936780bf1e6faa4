'use client';

import { useMemo, useState } from 'react';
import useSWR from 'swr';
import { z } from 'zod';
import { SectionHeader } from '@/components/shell/section-header';
import { DataPart } from '@/components/ui/data-part';
import { Field } from '@/components/ui/field';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { TextInput } from '@/components/ui/text-input';
import { fetcher } from '@/lib/client/fetcher';

const schema = z.record(z.string(), z.unknown());
const contentSchema = z.record(z.string(), z.object({ schema: schema.optional() }));
const operationSchema = z.object({
  operationId: z.string(),
  summary: z.string(),
  description: z.string().optional(),
  tags: z.array(z.string()),
  parameters: z
    .array(z.object({ name: z.string(), in: z.string(), required: z.boolean().optional(), schema }))
    .default([]),
  requestBody: z.object({ content: contentSchema }).optional(),
  responses: z.record(z.string(), z.object({ description: z.string(), content: contentSchema.optional() })),
});
/** As much of OpenAPI as this page shows. */
const documentSchema = z.object({
  info: z.object({ title: z.string(), description: z.string() }),
  paths: z.record(z.string(), z.record(z.string(), operationSchema)),
});

interface Entry {
  readonly method: string;
  readonly path: string;
  readonly operation: z.infer<typeof operationSchema>;
}

/** What can be asked of the API, to be read; programs read the same from /api/openapi. */
export function ApiReferencePage() {
  const answer = useSWR('/api/openapi', (url: string) => fetcher(url, documentSchema), { revalidateOnFocus: false });
  return (
    <>
      <SectionHeader current="/api-reference" />
      <Page>
        <Panel title="API reference" level={1}>
          <DataPart answer={answer} loading="Loading the reference">
            {(document) => <Reference document={document} />}
          </DataPart>
        </Panel>
      </Page>
    </>
  );
}

function Reference({ document }: { readonly document: z.infer<typeof documentSchema> }) {
  const [search, setSearch] = useState('');
  const entries = useMemo(
    () =>
      Object.entries(document.paths).flatMap(([path, methods]) =>
        Object.entries(methods).map(([method, operation]): Entry => ({ method, path, operation })),
      ),
    [document],
  );
  const words = search.trim().toLowerCase();
  const found = entries.filter(({ method, path, operation }) =>
    `${method} ${path} ${operation.summary}`.toLowerCase().includes(words),
  );
  return (
    <>
      <div className="grid gap-3 border-b border-rule px-3.5 py-3">
        <p className="max-w-prose text-[0.9375rem]">
          {document.info.description} Programs read all of this from{' '}
          <a className="text-petrol underline" href="/api/openapi">
            /api/openapi
          </a>{' '}
          (OpenAPI 3.1).
        </p>
        <Field label="Find">
          <TextInput
            type="search"
            value={search}
            placeholder="revision, GET, share link"
            onChange={(event) => setSearch(event.target.value)}
          />
        </Field>
        <p aria-live="polite" className="text-sm text-ink-soft">
          {found.length} of {entries.length} operations
        </p>
      </div>
      <ul>
        {found.map((entry) => (
          <li key={entry.operation.operationId} className="border-t border-hair first:border-t-0">
            <OperationRow {...entry} />
          </li>
        ))}
      </ul>
    </>
  );
}

function OperationRow({ method, path, operation }: Entry) {
  const body = Object.entries(operation.requestBody?.content ?? {});
  return (
    <details className="px-3.5 py-2">
      <summary className="flex min-h-8 cursor-pointer flex-wrap items-baseline gap-x-3 pointer-coarse:min-h-11">
        <span className="shrink-0 font-mono text-sm font-medium text-petrol sm:w-14">{method.toUpperCase()}</span>
        <span className="min-w-0 font-mono text-sm break-all">{path}</span>
        <span className="min-w-0 text-ink-soft max-sm:w-full sm:flex-1 sm:text-right">{operation.summary}</span>
      </summary>
      <div className="grid gap-3 pt-2 pb-1 text-[0.9375rem] sm:pl-17">
        {operation.description && <p>{operation.description}</p>}
        {operation.parameters.length > 0 && (
          <dl className="grid gap-1">
            {operation.parameters.map((parameter) => (
              <div key={`${parameter.in} ${parameter.name}`} className="flex flex-wrap gap-x-2">
                <dt className="font-mono text-sm">{parameter.name}</dt>
                <dd className="text-sm text-ink-soft">
                  in {parameter.in}
                  {parameter.required ? '' : ', may be left out'}, {wordsOf(parameter.schema)}
                </dd>
              </div>
            ))}
          </dl>
        )}
        {body.map(([mediaType, content]) => (
          <SchemaBox key={mediaType} title={`Sends ${mediaType}`} schema={content.schema} />
        ))}
        {Object.entries(operation.responses)
          .filter(([status]) => status.startsWith('2'))
          .flatMap(([status, response]) => {
            const content = Object.entries(response.content ?? {});
            if (content.length === 0) return [<p key={status}>Answers {status}, empty.</p>];
            return content.map(([mediaType, each]) => (
              <SchemaBox key={status} title={`Answers ${status} ${mediaType}`} schema={each.schema} />
            ));
          })}
      </div>
    </details>
  );
}

function wordsOf(parameter: Record<string, unknown>): string {
  const type = typeof parameter.type === 'string' ? parameter.type : 'value';
  const format = typeof parameter.format === 'string' ? ` (${parameter.format})` : '';
  const choices = Array.isArray(parameter.enum) ? `: ${parameter.enum.join(', ')}` : '';
  return `${type}${format}${choices}`;
}

function SchemaBox({ title, schema: shown }: { readonly title: string; readonly schema?: Record<string, unknown> }) {
  return (
    <div className="min-w-0">
      <p className="text-sm font-medium">{title}</p>
      {shown && (
        <pre
          tabIndex={0}
          aria-label={title}
          className="max-h-80 overflow-auto border border-rule bg-paper px-2.5 py-2 font-mono text-[0.8125rem]"
        >
          {JSON.stringify(shown, null, 2)}
        </pre>
      )}
    </div>
  );
}
