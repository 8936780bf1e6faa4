'use client';

import { useState, type ReactNode } from 'react';

interface SwipeSheetsProps {
  readonly left: ReactNode;
  readonly right: ReactNode;
  readonly leftName: string;
  readonly rightName: string;
  readonly size: { readonly width: number; readonly height: number };
}

const MIDDLE = 50;

/** One sheet over the other with a line between them that is drawn across: by pointer, touch or arrow keys. */
export function SwipeSheets({ left, right, leftName, rightName, size }: SwipeSheetsProps) {
  const [percent, setPercent] = useState(MIDDLE);
  return (
    <div className="relative overflow-hidden" style={size}>
      <div className="absolute inset-0">{left}</div>
      <div className="absolute inset-0" style={{ clipPath: `inset(0 0 0 ${percent}%)` }}>
        {right}
      </div>
      <div
        aria-hidden
        className="pointer-events-none absolute inset-y-0 w-0.5 -translate-x-1/2 bg-petrol"
        style={{ left: `${percent}%` }}
      />
      <span className="pointer-events-none absolute top-2 left-2 border border-rule bg-sheet px-1.5 text-sm font-semibold">
        {leftName}
      </span>
      <span className="pointer-events-none absolute top-2 right-2 border border-rule bg-sheet px-1.5 text-sm font-semibold">
        {rightName}
      </span>
      <input
        type="range"
        min={0}
        max={100}
        value={percent}
        onChange={(event) => setPercent(Number(event.target.value))}
        aria-label={`Line between ${leftName} and ${rightName}`}
        aria-valuetext={`${percent} percent ${leftName}`}
        className="absolute inset-x-0 bottom-2 mx-3 accent-petrol pointer-coarse:h-11"
        style={{ width: size.width - 24 }}
      />
    </div>
  );
}
