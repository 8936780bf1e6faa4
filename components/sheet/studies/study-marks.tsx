'use client';

import { useMemo } from 'react';
import { Shape } from 'react-konva';
import { usePalette } from '@/components/sheet/drawing';
import { inkOf, letter, pixelOf, strokeInk, traceCircle, tracePath } from '@/components/sheet/drawing/ink';
import type { Palette } from '@/lib/layout/palette';
import { SPACE_WORDS, type SpaceKind } from '@/lib/layout/spaces/spaces';
import { useSpaces } from './use-spaces';
import { useStudyView } from './study-store';
import { useStudyFloor } from './use-study-floor';

/** Marks of studies over the drawing: the best place, and the spaces that are shown. */
export function StudyMarks() {
  const { spaces, showsOverlap } = useStudyView();
  return (
    <>
      {(spaces.size > 0 || showsOverlap) && <SpaceLines />}
      <BestPlace />
    </>
  );
}

const CROSS_PX = 11;

function BestPlace() {
  const floor = useStudyFloor();
  const palette = usePalette();
  const best = floor?.best;
  if (!best) return null;
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        const arm = CROSS_PX * px;
        ink.beginPath();
        ink.moveTo(best.xMm - arm, best.yMm);
        ink.lineTo(best.xMm + arm, best.yMm);
        ink.moveTo(best.xMm, best.yMm - arm);
        ink.lineTo(best.xMm, best.yMm + arm);
        strokeInk(ink, palette.sheet, 5 * px);
        strokeInk(ink, palette.petrol, 2 * px);
        traceCircle(ink, best.xMm, best.yMm, 0.6 * arm);
        strokeInk(ink, palette.petrol, 2 * px);
        letter(ink, palette, px, {
          text: `best, ${best.worst?.toFixed(3) ?? ''}`,
          xMm: best.xMm,
          yMm: best.yMm,
          offsetPx: [16, -12],
          align: 'left',
          colour: palette.petrol,
        });
      }}
    />
  );
}

const DASHES: Record<SpaceKind, readonly number[]> = { maximum: [12, 5], restricted: [12, 4, 2, 4], operating: [3, 3] };

function colourOf(kind: SpaceKind, palette: Palette): string {
  return kind === 'operating' ? palette.petrol : kind === 'restricted' ? palette.amber : palette.ink;
}

function SpaceLines() {
  const { spaces: kinds, showsOverlap } = useStudyView();
  const { robots, overlaps } = useSpaces();
  const palette = usePalette();
  const lines = useMemo(
    () =>
      robots.flatMap(({ robot, spaces }) =>
        spaces.filter(({ kind }) => kinds.has(kind)).map((space) => ({ name: robot.name, space })),
      ),
    [robots, kinds],
  );
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        if (showsOverlap) {
          for (const { outlineMm, areaM2, names } of overlaps) {
            tracePath(ink, outlineMm, true);
            ink.save();
            ink.globalAlpha = 0.14;
            ink.fillStyle = palette.petrol;
            ink.fill();
            ink.restore();
            strokeInk(ink, palette.petrol, px);
            const middle = outlineMm.reduce(([x, y], point) => [x + point[0], y + point[1]] as const, [0, 0] as const);
            letter(ink, palette, px, {
              text: `${names} ${areaM2.toFixed(2)} m²`,
              xMm: middle[0] / outlineMm.length,
              yMm: middle[1] / outlineMm.length,
              colour: palette.petrol,
            });
          }
        }
        for (const { name, space } of lines) {
          tracePath(ink, space.outlineMm, true);
          ink.setLineDash(DASHES[space.kind].map((dash) => dash * px));
          strokeInk(ink, colourOf(space.kind, palette), 1.5 * px);
          ink.setLineDash([]);
          const top = space.outlineMm.reduce((high, point) => (point[1] > high[1] ? point : high));
          letter(ink, palette, px, {
            text: `${name}, ${SPACE_WORDS[space.kind].toLowerCase()}`,
            xMm: top[0],
            yMm: top[1],
            offsetPx: [0, -8],
            weight: 400,
            colour: colourOf(space.kind, palette),
          });
        }
      }}
    />
  );
}
