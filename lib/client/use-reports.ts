'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import type { z } from 'zod';
import type { ExportSubject } from '@/lib/contracts/exports';
import { layoutImportAnswerSchema, type LayoutImportAnswer } from '@/lib/contracts/layout-file';
import { reportListSchema, reportSchema, type Report, type reportRequestSchema } from '@/lib/contracts/reports';
import { readAnswer, send } from './fetcher';
import { problemFrom, unreachable } from './problem-error';
import { useAnswer } from './use-answer';

const UNDER_WAY_MS = 1200;

const listUrl = (subject: ExportSubject, subjectId: string): string =>
  `/api/reports?subject=${subject}&subjectId=${subjectId}`;

const isUnderWay = ({ state }: Report): boolean => state === 'queued' || state === 'running';

/** The reports of a sheet, asked for again while one is being made. */
export function useReports(subject: ExportSubject, subjectId: string) {
  return useAnswer(listUrl(subject, subjectId), reportListSchema, {
    refreshInterval: (answer) => (answer?.reports.some(isUnderWay) ? UNDER_WAY_MS : 0),
  });
}

/** All throw ProblemError. */
export function useReportActions(subject: ExportSubject, subjectId: string) {
  const { mutate } = useSWRConfig();
  return useMemo(() => {
    const url = listUrl(subject, subjectId);
    return {
      async ask(options: z.input<typeof reportRequestSchema>['options']): Promise<void> {
        await send('POST', '/api/reports', { subject, subjectId, options }, reportSchema);
        await mutate(url);
      },
      async retry(reportId: string): Promise<void> {
        await send('POST', `/api/reports/${reportId}/retry`, undefined, reportSchema);
        await mutate(url);
      },
      async remove(reportId: string): Promise<void> {
        await send('DELETE', `/api/reports/${reportId}`);
        await mutate(url);
      },
    };
  }, [mutate, subject, subjectId]);
}

/** Sends a layout file; gives the new variant. Throws ProblemError with one entry a fault. */
export async function importLayout(projectId: string, file: File): Promise<LayoutImportAnswer> {
  let response: Response;
  try {
    const headers = { 'Content-Type': 'application/json', Accept: 'application/json' };
    response = await fetch(`/api/projects/${projectId}/import`, { method: 'POST', headers, body: file });
  } catch {
    throw unreachable();
  }
  const body: unknown = await response.json().catch(() => null);
  if (!response.ok) throw problemFrom(response.status, body);
  return readAnswer(layoutImportAnswerSchema, body);
}
