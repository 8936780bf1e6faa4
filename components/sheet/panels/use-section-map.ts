'use client';

import { useEffect, useMemo, useState } from 'react';
import type { PlumbReading } from '@/lib/editor/plumb';
import { sectionRows, type SectionMap, type SectionQuestion } from '@/lib/editor/section-map';
import { mapRequestOf, questionOfRobot } from '@/lib/layout/map-question';
import type { MapSettings } from '@/lib/layout/map-settings';
import type { LibraryArm } from '@/lib/contracts/arms';
import type { SideView } from './side-view';

/** A section begins once the plumb rests, and gives the page its turn after so much work. */
const REST_MS = 160;
const SLICE_MS = 7;
const CELLS_ACROSS = 56;
const KEPT = 12;

/** Sections already computed; a base that moved on its line asks for the same one. */
const kept = new Map<string, SectionMap>();

/** The vertical map behind the plumb's arm. It is computed in small portions, so nothing waits for it. */
export function useSectionMap(
  reading: PlumbReading | null,
  arm: LibraryArm | undefined,
  settings: MapSettings,
  view: SideView | null,
): SectionMap | null {
  const question = useMemo(() => {
    if (!reading || !arm || !view) return null;
    const { request, arm: armInBase } = mapRequestOf(questionOfRobot(reading.robot, settings), arm.definition);
    const riserMm = reading.robot.riserMm;
    const asked: SectionQuestion = {
      arm: armInBase,
      // Whole degrees: a cut that is a hair off looks the same and need not be computed again.
      headingDeg: Math.round(reading.headingDeg - reading.robot.angleDeg),
      direction: request.direction,
      roll: request.roll,
      wrist: settings.wrist,
      fromMm: [view.fromMm[0], view.fromMm[1] - riserMm],
      toMm: [view.toMm[0], view.toMm[1] - riserMm],
      stepMm: (view.toMm[0] - view.fromMm[0]) / CELLS_ACROSS,
    };
    return { asked, key: JSON.stringify([arm.id, { ...asked, arm: armInBase.tool }]) };
  }, [reading, arm, settings, view]);

  const key = question?.key ?? null;
  const [done, setDone] = useState<{ key: string; map: SectionMap } | null>(null);
  useEffect(() => {
    if (!key || !question || kept.has(key)) return;
    let timer = setTimeout(begin, REST_MS);
    function begin() {
      const rows = sectionRows(question!.asked);
      const slice = () => {
        const until = performance.now() + SLICE_MS;
        let step = rows.next();
        while (!step.done && performance.now() < until) step = rows.next();
        if (!step.done) {
          timer = setTimeout(slice);
          return;
        }
        kept.set(key!, step.value);
        for (const oldest of [...kept.keys()].slice(0, Math.max(0, kept.size - KEPT))) kept.delete(oldest);
        setDone({ key: key!, map: step.value });
      };
      slice();
    }
    return () => clearTimeout(timer);
    // The key holds everything that the question depends on.
    // eslint-disable-next-line react-hooks/exhaustive-deps -- a new question object with the same key must not begin again
  }, [key]);

  if (!key) return null;
  return kept.get(key) ?? (done?.key === key ? done.map : null);
}
