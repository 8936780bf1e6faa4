'use client';

import Link from 'next/link';
import { TextLink } from '@/components/ui/link-button';
import { LoadingLine } from '@/components/ui/loading-line';
import { Moment } from '@/components/ui/moment';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { useLayouts } from '@/lib/client/use-project';
import { useLayoutRemarks } from '@/lib/client/use-remarks';
import type { LayoutSummary } from '@/lib/contracts/layouts';
import type { Remark } from '@/lib/contracts/remarks';
import { DataPart } from '@/components/ui/data-part';

/** The remarks that wait for an answer, each leading to its spot on the revision. */
export function OpenRemarksPanel({ projectId, count }: { projectId: string; count: number | undefined }) {
  const answer = useLayouts(projectId);
  return (
    <Panel
      title="Open remarks"
      aside={
        <>
          <TextLink href={`/projects/${projectId}/remarks`}>All as a table</TextLink>
          <span className="font-mono font-medium text-ink">{count}</span>
        </>
      }
    >
      {count === undefined ? (
        <LoadingLine label="Loading the remarks" />
      ) : count === 0 ? (
        <p className="px-3.5 py-3 text-ink-soft">None. Remarks that customers pin to a revision appear here.</p>
      ) : (
        <DataPart answer={answer} loading="Loading the remarks">
          {({ layouts }) =>
            layouts
              .filter((layout) => layout.latestRevision !== null)
              .map((layout) => <LayoutRemarks key={layout.id} layout={layout} />)
          }
        </DataPart>
      )}
    </Panel>
  );
}

function LayoutRemarks({ layout }: { layout: LayoutSummary }) {
  const { remarks, error } = useLayoutRemarks(layout.id);
  if (!remarks) {
    if (!error) return <LoadingLine label={`Loading the remarks on ${layout.letter}`} />;
    return (
      <Notice tone="trouble" className="m-3.5">
        {error.message}
      </Notice>
    );
  }
  return (
    <ul className="[&+ul]:border-t [&+ul]:border-hair">
      {remarks
        .filter((remark) => remark.resolvedAt === null)
        .map((remark) => (
          <OpenRemark key={remark.id} remark={remark} letter={layout.letter} />
        ))}
    </ul>
  );
}

function OpenRemark({ remark, letter }: { remark: Remark; letter: string }) {
  const answers = remark.replies.length;
  return (
    <li className="border-t border-hair first:border-t-0">
      <Link
        href={`/revisions/${remark.revisionId}?remark=${remark.id}`}
        className="flex gap-3 px-3.5 py-2.5 hover:bg-petrol-wash focus-visible:-outline-offset-2"
      >
        <span className="mt-0.5 flex h-5 min-w-6 shrink-0 items-center justify-center rounded bg-red px-1 text-sm font-semibold text-sheet">
          {remark.number}
        </span>
        <span className="min-w-0">
          <span className="line-clamp-2">{remark.body}</span>
          <span className="block text-sm text-ink-soft">
            {remark.author.you ? 'You' : remark.author.name}, <Moment iso={remark.createdAt} /> · {letter} rev{' '}
            {remark.revisionNumber}
            {answers > 0 && ` · ${answers} ${answers === 1 ? 'answer' : 'answers'}`}
          </span>
        </span>
      </Link>
    </li>
  );
}
