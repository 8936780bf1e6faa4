'use client';

import { useCallback, useState } from 'react';
import { ProblemError, sayError } from '@/lib/client/fetcher';
import { useFloorPlanActions } from '@/lib/client/use-floor-plans';
import { FLOOR_PLAN_MAX_BYTES, type FloorPlan } from '@/lib/contracts/floor-plans';

export interface UploadUnderWay {
  id: number;
  name: string;
  /** Share of the bytes that left; at 1 the server is still checking the picture. */
  share: number;
  /** Why it was refused; undefined while it goes on. */
  refusal?: string;
  cancel: () => void;
}

let lastId = 0;

const MEGABYTE = 1024 * 1024;

/** What can be said before a single byte is sent. */
function refusalOf(file: File): string | null {
  if (file.size === 0) return 'The file is empty (0 bytes). Save the floor plan again and upload it.';
  if (file.size <= FLOOR_PLAN_MAX_BYTES) return null;
  const size = Math.ceil(file.size / MEGABYTE);
  return `The file has ${size} MB; ${FLOOR_PLAN_MAX_BYTES / MEGABYTE} MB is the limit. Save it with fewer pixels, or as JPEG, and try again.`;
}

/** Floor plans on their way to the server, with progress, refusal and cancel. A refusal stays until it is put away. */
export function useUploads(projectId: string, onStored: (floorPlan: FloorPlan) => void) {
  const { add } = useFloorPlanActions(projectId);
  const [uploads, setUploads] = useState<readonly UploadUnderWay[]>([]);

  const drop = useCallback((id: number) => setUploads((all) => all.filter((one) => one.id !== id)), []);
  const change = useCallback(
    (id: number, part: Partial<UploadUnderWay>) =>
      setUploads((all) => all.map((one) => (one.id === id ? { ...one, ...part } : one))),
    [],
  );

  const start = useCallback(
    async (file: File) => {
      const id = ++lastId;
      const controller = new AbortController();
      const refusal = refusalOf(file) ?? undefined;
      setUploads((all) => [...all, { id, name: file.name, share: 0, refusal, cancel: () => controller.abort() }]);
      if (refusal) return;
      try {
        const floorPlan = await add(file, (share) => change(id, { share }), controller.signal);
        drop(id);
        onStored(floorPlan);
      } catch (error) {
        if (error instanceof DOMException && error.name === 'AbortError') drop(id);
        else change(id, { refusal: saidOf(error) });
      }
    },
    [add, change, drop, onStored],
  );
  return { uploads, start, putAway: drop };
}

const saidOf = (error: unknown): string =>
  (error instanceof ProblemError && error.fieldMessage('file')) || sayError(error);
