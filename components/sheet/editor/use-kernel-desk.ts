'use client';

import { useEffect, useState, useSyncExternalStore } from 'react';
import { KernelDesk, type DeskAnswer, type DeskJob } from '@/lib/client/kernel-desk';
import type { LiveMap, LiveMapTask } from '@/lib/layout/live-map';
import type { SectionTask, SectionTile } from '@/lib/layout/section-cut';
import type { KernelAnswer, KernelTask } from './kernel-worker';

interface Desks {
  readonly map: { readonly task: LiveMapTask; readonly result: LiveMap };
  readonly section: { readonly task: SectionTask; readonly result: SectionTile };
}

/** A desk and its worker, which is started when there is something to do. */
class KernelOffice<K extends keyof Desks> {
  private worker: Worker | null = null;
  readonly desk: KernelDesk<Desks[K]['task'], Desks[K]['result']>;

  constructor(kind: K) {
    this.desk = new KernelDesk((task) => this.worker?.postMessage({ kind, task } as KernelTask));
  }

  want(jobs: readonly DeskJob<Desks[K]['task']>[]): void {
    if (typeof Worker === 'undefined') return;
    if (jobs.length > 0 && !this.worker) {
      this.worker = new Worker(new URL('./kernel-worker.ts', import.meta.url), { type: 'module' });
      this.worker.onmessage = ({ data }: MessageEvent<KernelAnswer>) =>
        data.result ? this.desk.take(data.result) : this.desk.fail();
      this.worker.onerror = () => this.desk.fail();
    }
    this.desk.want(jobs);
  }

  close(): void {
    this.worker?.terminate();
    this.worker = null;
    // What it had in hand will never come.
    this.desk.want([]);
    this.desk.fail();
  }
}

/**
 * Has jobs computed by the browser's own kernel in a worker, the newest of each slot first. `jobs` keeps its identity while nothing changes.
 * Without workers (old browsers, pages that may not start them) there are no answers, and the sheet waits for the stored maps.
 */
export function useKernelDesk<K extends keyof Desks>(
  kind: K,
  jobs: readonly DeskJob<Desks[K]['task']>[],
): ReadonlyMap<string, DeskAnswer<Desks[K]['result']>> {
  const [office] = useState(() => new KernelOffice(kind));
  useEffect(() => () => office.close(), [office]);
  useEffect(() => office.want(jobs), [office, jobs]);
  const { subscribe, getAnswers } = office.desk;
  return useSyncExternalStore(subscribe, getAnswers, getAnswers);
}
