import { calibrate, CalibrationFault, LEAST_PICKED_DISTANCE_PX } from './calibrate';
import type { Calibration, CalibrationRequest } from './calibration';
import type { PicturePoint } from './picture-view';

/** A calibration while it is being made: points may still be missing. Picture frame, pixels; distances in mm. */

export type LineName = 'scale' | 'check' | 'level';
export type StepName = LineName | 'origin';
export type LineEnd = 'fromPx' | 'toPx';
/** Names one point that can be picked. */
export type Handle = `${LineName}.${LineEnd}` | 'origin';

export interface DraftLine {
  readonly fromPx: PicturePoint | null;
  readonly toPx: PicturePoint | null;
  /** Of no meaning for the level line. */
  readonly distanceMm: number | null;
}

export interface CalibrationDraft {
  readonly scale: DraftLine;
  readonly check: DraftLine;
  readonly level: DraftLine;
  readonly originPx: PicturePoint;
}

export const STEPS: readonly StepName[] = ['scale', 'check', 'level', 'origin'];
export const LINES: readonly LineName[] = ['scale', 'check', 'level'];

const NO_LINE: DraftLine = { fromPx: null, toPx: null, distanceMm: null };

/** Nothing picked; the origin waits in the lower left corner, as on most drawings. */
export const emptyDraft = (heightPx: number): CalibrationDraft => ({
  scale: NO_LINE,
  check: NO_LINE,
  level: NO_LINE,
  originPx: [0, heightPx],
});

/** The draft that a stored calibration was made from. */
export function draftOf({ scale, check, level, originPx }: CalibrationRequest): CalibrationDraft {
  return { scale, check: check ?? NO_LINE, level: level ? { ...level, distanceMm: null } : NO_LINE, originPx };
}

const partsOf = (handle: Exclude<Handle, 'origin'>): [LineName, LineEnd] => handle.split('.') as [LineName, LineEnd];

export const stepOf = (handle: Handle): StepName => (handle === 'origin' ? 'origin' : partsOf(handle)[0]);

export const handlesOf = (step: StepName): readonly Handle[] =>
  step === 'origin' ? ['origin'] : [`${step}.fromPx`, `${step}.toPx`];

export function pointOf(draft: CalibrationDraft, handle: Handle): PicturePoint | null {
  if (handle === 'origin') return draft.originPx;
  const [line, end] = partsOf(handle);
  return draft[line][end];
}

export function withPoint(draft: CalibrationDraft, handle: Handle, point: PicturePoint): CalibrationDraft {
  if (handle === 'origin') return { ...draft, originPx: point };
  const [line, end] = partsOf(handle);
  return { ...draft, [line]: { ...draft[line], [end]: point } };
}

export function withDistance(draft: CalibrationDraft, line: LineName, distanceMm: number | null): CalibrationDraft {
  return { ...draft, [line]: { ...draft[line], distanceMm } };
}

export const withoutLine = (draft: CalibrationDraft, line: LineName): CalibrationDraft => ({
  ...draft,
  [line]: NO_LINE,
});

/** The next point of the step that has not been picked; null when all are. */
export const missingHandle = (draft: CalibrationDraft, step: StepName): Handle | null =>
  handlesOf(step).find((handle) => pointOf(draft, handle) === null) ?? null;

export type LineState = 'empty' | 'started' | 'complete';

export function lineState(draft: CalibrationDraft, line: LineName): LineState {
  const { fromPx, toPx, distanceMm } = draft[line];
  const needsDistance = line !== 'level';
  if (!fromPx && !toPx && (distanceMm === null || !needsDistance)) return 'empty';
  return fromPx && toPx && (!needsDistance || (distanceMm !== null && distanceMm > 0)) ? 'complete' : 'started';
}

/** Length of a drafted line in picture pixels; null until both points are there. */
export function draftLengthPx({ fromPx, toPx }: DraftLine): number | null {
  return fromPx && toPx ? Math.hypot(toPx[0] - fromPx[0], toPx[1] - fromPx[1]) : null;
}

export interface DraftReading {
  /** What can be told already, lines that are not finished left out; null without a scale. */
  readonly result: Calibration | null;
  /** What can be saved; null while something is missing or wrong. */
  readonly request: CalibrationRequest | null;
  /** What is missing or wrong, step by step. */
  readonly faults: Partial<Record<LineName, string>>;
}

function faultOf(draft: CalibrationDraft, line: LineName): string | null {
  const { fromPx, toPx, distanceMm } = draft[line];
  const state = lineState(draft, line);
  if (state === 'empty') return line === 'scale' ? 'Pick two points whose distance you know.' : null;
  const length = draftLengthPx(draft[line]);
  if (length !== null && length < LEAST_PICKED_DISTANCE_PX)
    return 'The two points lie on one spot. Pick two that are well apart.';
  if (state === 'complete') return null;
  if (!fromPx || !toPx)
    return fromPx ? 'Pick the second point.' : toPx ? 'Pick the first point.' : 'Pick the two points.';
  return distanceMm === null ? 'Write the distance between the two points.' : 'A distance is above zero.';
}

function usable(line: DraftLine): { fromPx: PicturePoint; toPx: PicturePoint; distanceMm: number } | null {
  const { fromPx, toPx, distanceMm } = line;
  return fromPx && toPx ? { fromPx, toPx, distanceMm: distanceMm ?? 0 } : null;
}

/** Reads the draft: the live result, what may be saved, and what still stands in the way. */
export function readDraft(draft: CalibrationDraft): DraftReading {
  const faults: Partial<Record<LineName, string>> = {};
  for (const line of LINES) {
    const fault = faultOf(draft, line);
    if (fault) faults[line] = fault;
  }
  const take = (line: LineName) => (faults[line] || lineState(draft, line) === 'empty' ? null : usable(draft[line]));
  const scale = take('scale');
  if (!scale) return { result: null, request: null, faults };
  const level = take('level');
  const request: CalibrationRequest = {
    scale,
    check: take('check'),
    level: level && { fromPx: level.fromPx, toPx: level.toPx },
    originPx: draft.originPx,
  };
  try {
    const result = calibrate(request);
    return { result, request: Object.keys(faults).length === 0 ? request : null, faults };
  } catch (error) {
    if (!(error instanceof CalibrationFault)) throw error;
    return { result: null, request: null, faults: { ...faults, [error.path]: error.message } };
  }
}
