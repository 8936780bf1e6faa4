'use client';

import { useMemo } from 'react';
import { useBoardSettings } from '@/components/sheet/editor/board-context';
import { plumbSpeeds, type PlumbPosture, type PlumbReading, type SpeedShape } from '@/lib/editor/plumb';

/** Drawing units a shape; both are drawn at one scale, so that they can be held against each other. */
const SIDE = 100;
const FILLED = 0.88;

interface SpeedShapesProps {
  readonly reading: PlumbReading;
  readonly posture: PlumbPosture;
}

/** The velocity polygon with its ellipse, from above and from the side. */
export function SpeedShapes({ reading, posture }: SpeedShapesProps) {
  const { wrist } = useBoardSettings();
  const { floor, upright } = useMemo(() => plumbSpeeds(reading, posture, wrist), [reading, posture, wrist]);
  const farthest = Math.max(...[floor, upright].flatMap(({ polygon }) => polygon.map(([x, y]) => Math.hypot(x, y))), 0);
  if (!(farthest > 0)) return null;
  const unit = (FILLED * SIDE) / 2 / farthest;
  return (
    <div className="mt-2 grid grid-cols-2 gap-2">
      <Shape shape={floor} unit={unit} name="From above" />
      <Shape shape={upright} unit={unit} name="From the side" />
    </div>
  );
}

function Shape({ shape, unit, name }: { readonly shape: SpeedShape; readonly unit: number; readonly name: string }) {
  const { polygon, ellipse } = shape;
  const path = polygon.map(([x, y]) => `${(x * unit).toFixed(2)} ${(-y * unit).toFixed(2)}`).join('L');
  const fastest = Math.max(0, ...polygon.map(([x, y]) => Math.hypot(x, y)));
  return (
    <figure className="border border-hair">
      <svg
        viewBox={`${-SIDE / 2} ${-SIDE / 2} ${SIDE} ${SIDE}`}
        role="img"
        aria-label={`Speeds of the tool ${name.toLowerCase()}: ${fastest.toFixed(2)} metres a second at most`}
        className="block w-full"
      >
        <path d={`M${-SIDE / 2} 0H${SIDE / 2}M0 ${-SIDE / 2}V${SIDE / 2}`} stroke="var(--hair)" />
        <path d={`M${path}Z`} fill="var(--petrol)" fillOpacity="0.18" stroke="var(--petrol)" strokeWidth="1.2" />
        <ellipse
          rx={ellipse.major * unit}
          ry={ellipse.minor * unit}
          transform={`rotate(${-ellipse.angleDeg})`}
          fill="none"
          stroke="var(--ink)"
          strokeWidth="0.8"
          strokeDasharray="3 2"
        />
        <circle r="2" fill="var(--red)" />
      </svg>
      <figcaption className="flex justify-between px-1.5 pb-0.5 text-xs text-ink-soft">
        <span>{name}</span>
        <span className="font-mono">{fastest.toFixed(2)} m/s</span>
      </figcaption>
    </figure>
  );
}
