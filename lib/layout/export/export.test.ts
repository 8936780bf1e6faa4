import { randomUUID } from 'node:crypto';
import DxfParser from 'dxf-parser';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { itemSchema, type Item } from '../items';
import { csvOf } from './csv';
import { dxfOf } from './dxf';
import { LAYERS, linework } from './linework';

const placed = { id: randomUUID(), angleDeg: 0, xMm: 0, yMm: 0 };

function hall(): Item[] {
  const square = [
    [-300, -200],
    [300, -200],
    [300, 200],
    [-300, 200],
  ];
  const point = { id: randomUUID(), name: 'Pick 1', xMm: 10.1234567, yMm: -20, zMm: 850 };
  return [
    { kind: 'robot', ...placed, name: 'R1', xMm: 1234.567891, yMm: -98.7654321, armId: randomUUID(), riserMm: 400 },
    { kind: 'fixture', ...placed, name: 'Nest\n0\nEOF', xMm: 900, yMm: 1 / 3, angleDeg: 33, outlineMm: square, zToMm: 800, taskPoints: [point] },
    { kind: 'guardLine', ...placed, name: 'Guard', pointsMm: [[0, 0], [5000, 0], [5000, 4000.0000001]] },
    { kind: 'walkway', ...placed, name: 'Way', pointsMm: [[0, 0], [2000, 0]], widthMm: 1200 },
    { kind: 'obstacle', ...placed, name: 'Säule ≥ 3', outlineMm: square, zToMm: 3000 },
    { kind: 'dimension', ...placed, name: 'D1', fromMm: [0, 0], toMm: [3000, 0], offsetMm: 300 },
  ].map((item) =>
    itemSchema.parse({ ...item, id: randomUUID(), name: item.name.replace(/\n/g, ' ') }),
  ); // prettier-ignore
}

describe('the DXF of a sheet', () => {
  const items = hall();
  const drawn = linework(items, new Map([[items[0].id, { definition: {} as never, reachMm: 1400 }]]));
  // Read by another library than the one that wrote it: dxf-parser.
  const parsed = new DxfParser().parseSync(dxfOf(drawn));

  it('has every line and circle at the same place to 1e-6 mm, on its layer', () => {
    const read = parsed?.entities ?? [];
    const lines = read.filter(({ type }) => type === 'LWPOLYLINE') as unknown as {
      layer: string;
      vertices: { x: number; y: number }[];
      shape: boolean;
    }[];
    const wanted = drawn.filter((shape) => shape.kind === 'line');
    expect(lines).toHaveLength(wanted.length);
    wanted.forEach((line, index) => {
      expect(lines[index].layer).toBe(line.layer);
      expect(Boolean(lines[index].shape)).toBe(line.closed);
      line.points.forEach(([x, y], corner) => {
        expect(Math.abs(lines[index].vertices[corner].x - x)).toBeLessThan(1e-6);
        expect(Math.abs(lines[index].vertices[corner].y - y)).toBeLessThan(1e-6);
      });
    });
    const base = read.find((entity) => entity.type === 'CIRCLE' && entity.layer === 'ROBOTS') as unknown as {
      center: { x: number; y: number; z: number };
    };
    expect(Math.abs(base.center.x - 1234.567891)).toBeLessThan(1e-6);
    expect(Math.abs(base.center.y + 98.7654321)).toBeLessThan(1e-6);
    expect(base.center.z).toBe(400);
    const spot = read.find(({ type }) => type === 'POINT') as unknown as { position: { z: number } };
    expect(spot.position.z).toBe(850);
  });

  it('names its layers and says that it is in millimetres', () => {
    const { layers } = parsed?.tables.layer as unknown as { layers: Record<string, unknown> };
    expect(Object.keys(layers)).toEqual(expect.arrayContaining([...LAYERS]));
    // 4 is millimetres: DXF reference, header variable $INSUNITS (from memory).
    expect(parsed?.header.$INSUNITS).toBe(4);
  });

  it('cannot be broken out of by a name', () => {
    const shape = {
      ...drawn.find(({ kind }) => kind === 'words')!,
      text: 'A\n  0\nENDSEC\u2028≥',
    } as (typeof drawn)[number];
    const read = new DxfParser().parseSync(dxfOf([shape]));
    expect(read?.entities).toHaveLength(1);
  });
});

describe('a CSV table', () => {
  it('makes cells harmless that a table program would run, and keeps numbers numbers', () => {
    const risky = ['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\rx', '\nx'];
    const text = csvOf(['=Name', 'Value'], [...risky.map((cell) => [cell, -1.5]), ['say "hi", twice', 1e-7]]);
    // Read by another library than the one that wrote it: Papa Parse.
    const { data } = Papa.parse<string[]>(text, { skipEmptyLines: true });
    expect(data[0]).toEqual(["'=Name", 'Value']);
    risky.forEach((cell, index) => expect(data[index + 1]).toEqual([`'${cell}`, '-1.5']));
    expect(data[8]).toEqual(['say "hi", twice', '1e-7']);
    expect(csvOf(['a'], [[NaN], [null], [true]])).toBe('\uFEFFa\r\n\r\n\r\nyes\r\n');
  });
});
