'use client';

import { useMemo } from 'react';
import type { SheetDocument } from '@/lib/client/sheet-document';
import { readingBounds } from '@/lib/editor/reading-bounds';
import { restPosture } from '@/lib/editor/rest-posture';
import type { Robot } from '@/lib/layout/items';
import type { MapSettings } from '@/lib/layout/map-settings';
import type { VerdictBand } from '@/lib/layout/verdict-words';
import { floorWork, type FloorWork } from '@/lib/layout/judging/drawn-work';
import { judgeCell, type CellVerdicts, type PointVerdict } from '@/lib/layout/verdicts';
import type { FloorBounds } from '@/lib/layout/viewport';

/** What the browser's own kernel says of a sheet that nobody is editing. */
export interface SheetReading {
  readonly robots: readonly Robot[];
  /** Of task points, paths and patterns. */
  readonly cell: CellVerdicts;
  readonly verdicts: readonly PointVerdict[];
  readonly work: FloorWork;
  readonly bands: ReadonlyMap<string, VerdictBand>;
  readonly postures: ReadonlyMap<string, readonly number[]>;
  readonly bounds: FloorBounds | null;
}

export function readSheet({ items, arms }: SheetDocument, wrist: MapSettings['wrist']): SheetReading {
  const shown = items.filter(({ hidden }) => !hidden);
  const robots = shown.filter((item): item is Robot => item.kind === 'robot' && arms.has(item.armId));
  const cell = judgeCell(shown, (armId) => arms.get(armId)?.definition, wrist);
  const verdicts = cell.points;
  const postures = new Map<string, readonly number[]>();
  for (const robot of robots) {
    const arm = arms.get(robot.armId)!;
    // Shown at the first task point that falls to it, or else at rest.
    const working = verdicts.find(({ best }) => best?.robotId === robot.id && best.posture)?.best?.posture?.joints;
    const posture = working ?? restPosture(arm.definition, arm.reachMm, robot.tool);
    if (posture) postures.set(robot.id, posture);
  }
  const bands = new Map(verdicts.flatMap(({ pointId, best }) => (best ? [[pointId, best.band] as const] : [])));
  return { robots, cell, verdicts, work: floorWork(shown, cell), bands, postures, bounds: readingBounds(shown, arms) };
}

export function useSheetReading(document: SheetDocument | null, wrist: MapSettings['wrist']): SheetReading | null {
  return useMemo(() => document && readSheet(document, wrist), [document, wrist]);
}
