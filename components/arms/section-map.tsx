'use client';

import { useEffect, useRef, type CSSProperties } from 'react';
import { scaleTable, shareOf, TABLE_SIZE, valueRange } from '@/lib/layout/scales';
import type { ArmStudy } from './use-arm-study';

/** The map of the cut, one canvas pixel a small cell, to be stretched over its place by the caller. */
export function SectionMap({ map, style }: { map: NonNullable<ArmStudy['map']>; style: CSSProperties }) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const { coarse, fine, fineGrid } = map;
  const { columns, rows } = fineGrid;
  useEffect(() => {
    const ink = canvas.current?.getContext('2d');
    if (!ink) return;
    const image = ink.createImageData(columns, rows);
    const pixels = new Uint32Array(image.data.buffer);
    const colours = scaleTable('tide');
    // Of the large cells alone, so that no colour changes while the small ones come in.
    const range = valueRange('inverseConditionNumber', ...coarse.rows);
    for (let row = 0; row < rows; row++) {
      const start = (rows - 1 - row) * columns;
      const small = fine[row];
      const large = coarse.rows[row >> 2];
      for (let column = 0; column < columns; column++) {
        const value = small ? small[column] : large[column >> 2];
        // Not reached is bare paper, never a colour of the scale.
        if (!Number.isNaN(value))
          pixels[start + column] = colours[Math.min(TABLE_SIZE - 1, Math.floor(shareOf(range, value) * TABLE_SIZE))];
      }
    }
    ink.putImageData(image, 0, 0);
  }, [coarse, fine, columns, rows]);
  return (
    <canvas
      ref={canvas}
      width={columns}
      height={rows}
      aria-hidden
      data-section-rows={fine.length}
      className="absolute"
      style={{ imageRendering: 'pixelated', ...style }}
    />
  );
}
