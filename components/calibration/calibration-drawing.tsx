'use client';

import { Circle, Group, Image as KonvaImage, Layer, Line, Rect, Stage, Text } from 'react-konva';
import type { Size } from '@/components/ui/use-size';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import { handlesOf, LINES, pointOf, stepOf, STEPS, type Handle, type LineName } from '@/lib/layout/calibration-draft';
import { DAY_PALETTE } from '@/lib/layout/palette';
import { pictureToScreen, pictureZoom } from '@/lib/layout/picture-view';
import type { ScreenPoint, Viewport } from '@/lib/layout/viewport';
import { HANDLE_MARKS } from './step-words';
import type { CalibrationInHand } from './use-calibration';

interface CalibrationDrawingProps {
  floorPlan: FloorPlan;
  picture: HTMLImageElement | null;
  calibration: CalibrationInHand;
  viewport: Viewport;
  size: Size;
}

/** The picture is shown as it is on either board, so the marks keep the day's ink and carry a light edge of their own. */
const INK = DAY_PALETTE;
const EDGE = '#ffffff';
const DASHES: Record<LineName, number[]> = { scale: [], check: [8, 5], level: [14, 4, 2, 4] };

/** Canvas part of the calibration: the picture, the three lines, the points and the axes at the origin. */
export function CalibrationDrawing({ floorPlan, picture, calibration, viewport, size }: CalibrationDrawingProps) {
  const { draft, selected, step } = calibration;
  const corner = pictureToScreen(viewport, [0, 0]);
  const zoom = pictureZoom(viewport);
  const at = (handle: Handle): ScreenPoint | null => {
    const point = pointOf(draft, handle);
    return point && pictureToScreen(viewport, point);
  };
  const place = { x: corner.x, y: corner.y, width: floorPlan.widthPx * zoom, height: floorPlan.heightPx * zoom };
  return (
    <Stage width={size.width} height={size.height} listening={false}>
      <Layer listening={false} imageSmoothingEnabled={zoom < 2}>
        <Rect {...place} fill="#ffffff" stroke={INK.inkSoft} strokeWidth={1} />
        {picture && <KonvaImage {...place} image={picture} />}
      </Layer>
      <Layer listening={false}>
        {LINES.map((line) => {
          const from = at(`${line}.fromPx`);
          const to = at(`${line}.toPx`);
          if (!from || !to) return null;
          const points = [from.x, from.y, to.x, to.y];
          const colour = line === step ? INK.petrol : INK.ink;
          return (
            <Group key={line}>
              <Line points={points} stroke={EDGE} strokeWidth={5} opacity={0.8} />
              <Line points={points} stroke={colour} strokeWidth={1.75} dash={DASHES[line]} />
            </Group>
          );
        })}
        <Axes at={pictureToScreen(viewport, draft.originPx)} turnDeg={calibration.result?.rotationDeg ?? 0} />
        {/* The open step's points lie on top, where several share a corner. */}
        {[...STEPS.filter((other) => other !== step), step].flatMap(handlesOf).map((handle) => {
          const screen = at(handle);
          if (!screen) return null;
          const isSelected = handle === selected;
          return (
            <Crosshair
              key={handle}
              at={screen}
              mark={HANDLE_MARKS[handle]}
              colour={isSelected ? INK.red : stepOf(handle) === step ? INK.petrol : INK.ink}
              isSelected={isSelected}
            />
          );
        })}
      </Layer>
    </Stage>
  );
}

interface CrosshairProps {
  at: ScreenPoint;
  mark: string;
  colour: string;
  isSelected: boolean;
}

/** A ring with four hairs; its middle stays free, so that the spot itself can be seen. */
function Crosshair({ at, mark, colour, isSelected }: CrosshairProps) {
  const reach = isSelected ? 18 : 14;
  const hairs = [
    [-reach, 0, -3, 0],
    [3, 0, reach, 0],
    [0, -reach, 0, -3],
    [0, 3, 0, reach],
  ];
  return (
    <Group x={at.x} y={at.y}>
      {hairs.map((points, index) => (
        <Line key={`edge-${index}`} points={points} stroke={EDGE} strokeWidth={4.5} opacity={0.85} />
      ))}
      <Circle radius={9} stroke={EDGE} strokeWidth={4.5} opacity={0.85} />
      {hairs.map((points, index) => (
        <Line key={index} points={points} stroke={colour} strokeWidth={1.5} />
      ))}
      <Circle radius={9} stroke={colour} strokeWidth={isSelected ? 2.25 : 1.5} />
      <Text
        x={12}
        y={-26}
        text={mark}
        fontFamily={INK.mono}
        fontSize={14}
        fontStyle="600"
        fill={colour}
        stroke={EDGE}
        strokeWidth={4}
        fillAfterStrokeEnabled
      />
    </Group>
  );
}

/** The floor's axes: x along the level line, y away. */
function Axes({ at, turnDeg }: { at: ScreenPoint; turnDeg: number }) {
  const length = 54;
  // The picture is turned by turnDeg counter-clockwise against the floor, so the floor's x axis lies the other way round on it.
  const arms: [string, number[], number[]][] = [
    ['x', [0, 0, length, 0], [length + 6, -7]],
    ['y', [0, 0, 0, -length], [-4, -length - 18]],
  ];
  return (
    <Group x={at.x} y={at.y} rotation={turnDeg}>
      {arms.map(([name, points, [x, y]]) => (
        <Group key={name}>
          <Line points={points} stroke={EDGE} strokeWidth={5} opacity={0.8} />
          <Line points={points} stroke={INK.ink} strokeWidth={1.75} />
          <Text
            x={x}
            y={y}
            text={name}
            fontFamily={INK.mono}
            fontSize={14}
            fill={INK.ink}
            stroke={EDGE}
            strokeWidth={4}
            fillAfterStrokeEnabled
          />
        </Group>
      ))}
    </Group>
  );
}
