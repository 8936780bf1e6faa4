import { describe, expect, it } from 'vitest';
import truth from '@/tests/fixtures/floor-plans/truth.json';
import {
  draftOf,
  emptyDraft,
  lineState,
  missingHandle,
  pointOf,
  readDraft,
  withDistance,
  withoutLine,
  withPoint,
  type CalibrationDraft,
} from './calibration-draft';
import type { PicturePoint } from './picture-view';

// Picture points and true sizes of the bay, as they came with the pictures (truth.json).
const SCAN = truth['plan-scan.jpg'];
const LEFT = SCAN.bay_left_bottom as PicturePoint;
const RIGHT = SCAN.bay_right_bottom as PicturePoint;
const TOP = SCAN.bay_right_top as PicturePoint;

function pick(draft: CalibrationDraft, line: 'scale' | 'check' | 'level', from: PicturePoint, to: PicturePoint) {
  return withPoint(withPoint(draft, `${line}.fromPx`, from), `${line}.toPx`, to);
}

const scaled = withDistance(pick(emptyDraft(SCAN.h), 'scale', LEFT, RIGHT), 'scale', 9000);

describe('a calibration being drafted', () => {
  it('starts with nothing picked and the origin in the lower left corner', () => {
    const draft = emptyDraft(1880);
    expect(missingHandle(draft, 'scale')).toBe('scale.fromPx');
    expect(pointOf(draft, 'origin')).toEqual([0, 1880]);
    expect(readDraft(draft)).toMatchObject({ result: null, request: null });
  });

  it('asks for what is missing, one thing at a time', () => {
    let draft = emptyDraft(SCAN.h);
    draft = withPoint(draft, 'scale.fromPx', LEFT);
    expect(missingHandle(draft, 'scale')).toBe('scale.toPx');
    expect(readDraft(draft).faults.scale).toBe('Pick the second point.');
    draft = withPoint(draft, 'scale.toPx', RIGHT);
    expect(readDraft(draft).faults.scale).toBe('Write the distance between the two points.');
    draft = withDistance(draft, 'scale', 0);
    expect(readDraft(draft).faults.scale).toBe('A distance is above zero.');
    draft = withDistance(draft, 'scale', 9000);
    expect(lineState(draft, 'scale')).toBe('complete');
    expect(readDraft(draft).faults).toEqual({});
  });

  it('tells the result as far as it goes while a later step is unfinished, but lets nothing half-done be saved', () => {
    const started = withPoint(scaled, 'check.fromPx', RIGHT);
    const { result, request, faults } = readDraft(started);
    expect(result?.mmPerPx).toBeCloseTo(SCAN.mmPerPx, 2);
    expect(result?.checkError).toBeNull();
    expect(request).toBeNull();
    expect(faults.check).toBe('Pick the second point.');
    expect(readDraft(withoutLine(started, 'check')).request).not.toBeNull();
  });

  it('finds the crooked scan’s turn and a check within half a percent', () => {
    const draft = pick(withDistance(pick(scaled, 'check', RIGHT, TOP), 'check', 5700), 'level', LEFT, RIGHT);
    const { result } = readDraft(draft);
    expect(Math.abs(result?.checkError ?? 1)).toBeLessThan(0.005);
    expect(Math.abs(result?.rotationDeg ?? 0)).toBeCloseTo(SCAN.turnedDegClockwise, 1);
  });

  it('refuses two points on one spot in place of throwing', () => {
    const { result, request, faults } = readDraft(withPoint(scaled, 'scale.toPx', LEFT));
    expect(result).toBeNull();
    expect(request).toBeNull();
    expect(faults.scale).toMatch(/lie on one spot/);
  });

  it('makes of a stored calibration the draft that it was made from', () => {
    const { request } = readDraft(pick(scaled, 'level', LEFT, RIGHT));
    expect(request).not.toBeNull();
    if (request) expect(readDraft(draftOf(request)).request).toEqual(request);
  });
});
