import { itemToFloor } from '../geometry';
import type { Fixture, Item, TaskPath, TaskPattern } from '../items';
import type { VerdictBand } from '../verdict-words';
import type { CellVerdicts } from './cell-judge';
import { pathLine, pathStepMm } from './path-line';
import { patternPlaces } from './places';

type Point = readonly [number, number];

/** Paths and patterns as they lie on the floor (mm), with what the verdicts say of them; 'unknown' where there is no robot. */
export interface FloorWork {
  readonly paths: readonly {
    readonly id: string;
    readonly name: string;
    readonly line: readonly Point[];
    readonly corners: readonly Point[];
    readonly weakest: readonly Point[];
    readonly band: VerdictBand | 'unknown';
  }[];
  readonly patterns: readonly {
    readonly id: string;
    readonly name: string;
    readonly places: readonly { readonly at: Point; readonly band: VerdictBand | 'unknown' }[];
    readonly worst: Point | null;
  }[];
}

/** Bands from the worst to the best, to tell which of a stack of places is drawn. */
const BADNESS: readonly (VerdictBand | 'unknown')[] = ['unknown', 'roomy', 'fair', 'tight', 'pinned', 'out'];

/** `items` as they are drawn now; the verdicts may lag behind a drag, so only lengths and bands are taken from them. */
export function floorWork(items: readonly Item[], { paths, patterns }: CellVerdicts): FloorWork {
  const pathVerdicts = new Map(paths.map((verdict) => [verdict.pathId, verdict]));
  const patternVerdicts = new Map(patterns.map((verdict) => [verdict.patternId, verdict]));
  const fixtures = items.filter((item): item is Fixture => item.kind === 'fixture' && !item.hidden);
  return {
    paths: fixtures.flatMap((fixture) =>
      fixture.taskPaths.map((path) => drawnPath(fixture, path, pathVerdicts.get(path.id)?.best ?? null)),
    ),
    patterns: fixtures.flatMap((fixture) =>
      fixture.taskPatterns.map((pattern) =>
        drawnPattern(fixture, pattern, patternVerdicts.get(pattern.id)?.best ?? null),
      ),
    ),
  };
}

function drawnPath(
  fixture: Fixture,
  { id, name, points }: TaskPath,
  best: CellVerdicts['paths'][number]['best'],
): FloorWork['paths'][number] {
  const onFloor = (x: number, y: number): Point => itemToFloor(fixture, [x, y]);
  const line = pathLine(points, pathStepMm(points)).points;
  const weak = best?.weakest;
  const inWeakest = weak ? line.filter(({ atMm }) => atMm >= weak.fromMm - 1e-6 && atMm <= weak.toMm + 1e-6) : [];
  return {
    id,
    name,
    line: line.map(({ positionMm: [x, y] }) => onFloor(x, y)),
    corners: points.map(({ xMm, yMm }) => onFloor(xMm, yMm)),
    weakest: inWeakest.map(({ positionMm: [x, y] }) => onFloor(x, y)),
    band: best?.band ?? 'unknown',
  };
}

function drawnPattern(
  fixture: Fixture,
  pattern: TaskPattern,
  best: CellVerdicts['patterns'][number]['best'],
): FloorWork['patterns'][number] {
  const stacks = new Map<string, { at: Point; band: VerdictBand | 'unknown' }>();
  for (const { place, xMm, yMm } of patternPlaces(pattern)) {
    const band = best?.bands[place - 1] ?? 'unknown';
    const key = `${xMm} ${yMm}`;
    const known = stacks.get(key);
    if (!known) stacks.set(key, { at: itemToFloor(fixture, [xMm, yMm]), band });
    else if (BADNESS.indexOf(band) > BADNESS.indexOf(known.band)) known.band = band;
  }
  const worst = best?.worst.place;
  return {
    id: pattern.id,
    name: pattern.name,
    places: [...stacks.values()],
    worst: worst ? itemToFloor(fixture, [worst.xMm, worst.yMm]) : null,
  };
}
