import type { Transform } from '@/lib/kinematics/transforms';
import type { Fixture, Item, SequenceStep, TaskPath, TaskPoint } from '../items';
import { floorPath, type FloorPath } from '../judging/floor-path';
import { patternPlace, placeCount } from '../judging/places';
import { poseOnFloor } from '../task-points';

/** A step with what it is about, looked up on the sheet; poses in the floor frame (m). */
export type ResolvedStep =
  | {
      readonly kind: 'point';
      readonly step: Extract<SequenceStep, { kind: 'point' }>;
      readonly label: string;
      readonly pose: Transform;
      readonly rollDeg: TaskPoint['rollDeg'];
      readonly dwellS: number;
    }
  | {
      readonly kind: 'path';
      readonly step: Extract<SequenceStep, { kind: 'path' }>;
      readonly label: string;
      readonly path: TaskPath;
      readonly floor: FloorPath;
    }
  | { readonly kind: 'wait'; readonly step: Extract<SequenceStep, { kind: 'wait' }>; readonly label: string }
  | { readonly kind: 'zone'; readonly step: Extract<SequenceStep, { kind: 'zone' }>; readonly label: string }
  | { readonly kind: 'lost'; readonly step: SequenceStep; readonly label: string; readonly message: string };

/** Looks a sequence up on the sheet. What is gone, or not asked for fully, comes back as `lost` with what is the matter. */
export function resolveSteps(sequence: readonly SequenceStep[], items: readonly Item[]): ResolvedStep[] {
  const byId = new Map(items.map((item) => [item.id, item]));
  return sequence.map((step): ResolvedStep => {
    if (step.kind === 'wait') return { kind: 'wait', step, label: step.name };
    if (step.kind === 'zone') {
      const zone = byId.get(step.zoneId);
      if (!zone)
        return lost(step, 'A zone', 'Its zone is gone from the sheet. Choose another one, or remove the step.');
      return { kind: 'zone', step, label: `${step.action === 'enter' ? 'Enter' : 'Leave'} ${zone.name}` };
    }
    const fixture = byId.get(step.fixtureId);
    if (fixture?.kind !== 'fixture')
      return lost(step, 'A task', 'Its fixture is gone from the sheet. Remove the step, or bring the fixture back.');
    return step.kind === 'path' ? resolvePath(step, fixture) : resolvePoint(step, fixture);
  });
}

const lost = (step: SequenceStep, label: string, message: string): ResolvedStep => ({
  kind: 'lost',
  step,
  label,
  message,
});

function resolvePath(step: Extract<SequenceStep, { kind: 'path' }>, fixture: Fixture): ResolvedStep {
  const path = fixture.taskPaths.find(({ id }) => id === step.taskPathId);
  if (!path) return lost(step, `A path of ${fixture.name}`, `Its path is gone from ${fixture.name}. Remove the step.`);
  return { kind: 'path', step, label: path.name, path, floor: floorPath(fixture, path) };
}

function resolvePoint(step: Extract<SequenceStep, { kind: 'point' }>, fixture: Fixture): ResolvedStep {
  const point = fixture.taskPoints.find(({ id }) => id === step.taskPointId);
  if (point) {
    const { rollDeg, dwellS, name } = point;
    return { kind: 'point', step, label: name, pose: poseOnFloor(fixture, point), rollDeg, dwellS };
  }
  const pattern = fixture.taskPatterns.find(({ id }) => id === step.taskPointId);
  if (!pattern)
    return lost(step, `A point of ${fixture.name}`, `Its task point is gone from ${fixture.name}. Remove the step.`);
  const count = placeCount(pattern);
  if (step.place === null || step.place > count)
    return lost(step, pattern.name, `Which place of ${pattern.name}? Write 1 to ${count} at the step.`);
  const { xMm, yMm, zMm } = patternPlace(pattern, step.place);
  return {
    kind: 'point',
    step,
    label: `${pattern.name}, place ${step.place}`,
    pose: poseOnFloor(fixture, { ...pattern, xMm, yMm, zMm }),
    rollDeg: pattern.rollDeg,
    dwellS: pattern.dwellS,
  };
}
