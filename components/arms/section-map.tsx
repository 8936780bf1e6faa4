'use client';

import { useEffect, useRef } from 'react';
import type { ArmDefinition } from '@/lib/contracts/arm';
import type { SectionGrid } from '@/lib/layout/arm-section';
import { scaleTable, shareOf, TABLE_SIZE, valueRange } from '@/lib/layout/scales';
import { useSectionMap } from './use-section-map';

/** The map of the cut, one canvas pixel a cell, to be stretched over its place by the caller. */
export function SectionMap({ arm, grid, className }: { arm: ArmDefinition; grid: SectionGrid; className?: string }) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const rows = useSectionMap(arm, grid);
  useEffect(() => {
    const ink = canvas.current?.getContext('2d');
    if (!ink) return;
    const image = ink.createImageData(grid.columns, grid.rows);
    const pixels = new Uint32Array(image.data.buffer);
    const colours = scaleTable('tide');
    const range = valueRange('inverseConditionNumber', ...rows);
    rows.forEach((values, row) => {
      const start = (grid.rows - 1 - row) * grid.columns;
      values.forEach((value, column) => {
        // Not reached is bare paper, never a colour of the scale.
        if (Number.isNaN(value)) return;
        pixels[start + column] = colours[Math.min(TABLE_SIZE - 1, Math.floor(shareOf(range, value) * TABLE_SIZE))];
      });
    });
    ink.putImageData(image, 0, 0);
  }, [rows, grid]);
  return (
    <canvas
      ref={canvas}
      width={grid.columns}
      height={grid.rows}
      aria-hidden
      className={className}
      style={{ imageRendering: 'pixelated' }}
    />
  );
}
