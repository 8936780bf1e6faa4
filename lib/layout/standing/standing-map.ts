import type { Transform } from '@/lib/kinematics/transforms';
import type { Arm } from '@/lib/kinematics/types';
import { outlinesMeet } from '../clearance/plane';
import { itemToFloor, type Placement, type PointMm } from '../geometry';
import { judgeTarget, type RobotVerdict } from '../judging/point-verdict';
import type { BasePlacement } from '../robot-frame';
import { poseOnFloor, targetInBase } from '../task-points';
import { BLOCKED, NOT_REACHED, type Stand, type StandingAnswer } from './answer';
import type { StandingQuestion, WorkPoint } from './question';
import { outcomeOf, studyBench } from './study-bench';

/** Some rows of a standing map, and the best place among them. */
export interface StandingRows {
  readonly values: readonly number[];
  readonly stances: readonly number[];
  readonly best: BestCell | null;
}

interface BestCell {
  readonly cell: number;
  readonly stance: number;
  readonly value: number;
  readonly allMet: boolean;
}

export interface StandingComputer {
  rows(rowFrom: number, rowTo: number): StandingRows;
  answer(slices: readonly StandingRows[]): StandingAnswer;
}

/** Places whose values differ by less are equally good; the nearer one to the drawn place is then the better. */
const SAME = 1e-9;

/**
 * For every place of the grid the worst inverse condition number over the points, at the best of the turns and risers. A place
 * counts as reached where every point is; wanted speeds do not close a place, but the best one is looked for among those that meet them all.
 */
export function makeStandingComputer(question: StandingQuestion, arm: Arm): StandingComputer {
  const { mover, grid, turnsDeg, risersMm, points, blocksMm, footprintMm, drawn, robot } = question;
  const bench = studyBench(question, arm);
  // The work stays where it is while the base moves, and is posed once.
  const poses = points.map((point) => poseOnFloor(point.fixture, point));

  const placeOf = (cell: number, stance: number): Placement & { riserMm: number } => ({
    xMm: grid.originMm[0] + (cell % grid.columns) * grid.stepMm,
    yMm: grid.originMm[1] + Math.floor(cell / grid.columns) * grid.stepMm,
    angleDeg: turnsDeg[Math.floor(stance / risersMm.length)],
    riserMm: risersMm[stance % risersMm.length],
  });
  const isBlocked = (place: Placement): boolean => {
    if (footprintMm === null || blocksMm.length === 0) return false;
    const taken = footprintMm.map((point) => itemToFloor(place, point));
    return blocksMm.some((block) => outlinesMeet(taken, block));
  };
  const verdictAt = (place: Placement & { riserMm: number }, point: WorkPoint, pose: Transform): RobotVerdict => {
    const base: BasePlacement = mover === 'robot' ? place : robot;
    const onFloor = mover === 'robot' ? pose : poseOnFloor(place, point);
    return judgeTarget(bench, targetInBase({ rollDeg: point.rollDeg, pose: onFloor }, base), point.speedMmS);
  };

  /** The point that the last place failed at is asked first: neighbours mostly fail alike. */
  let suspect = 0;
  const worstAt = (place: Placement & { riserMm: number }): { value: number; allMet: boolean } => {
    let value = Infinity;
    let allMet = true;
    for (let count = 0; count < points.length; count += 1) {
      const index = (suspect + count) % points.length;
      const verdict = verdictAt(place, points[index], poses[index]);
      if (!verdict.posture) {
        suspect = index;
        return { value: NOT_REACHED, allMet: false };
      }
      value = Math.min(value, verdict.posture.inverseConditionNumber);
      allMet &&= verdict.met;
    }
    return { value, allMet };
  };

  const distanceOf = ({ cell, stance }: BestCell): number => {
    const { xMm, yMm } = placeOf(cell, stance);
    return Math.hypot(xMm - drawn.xMm, yMm - drawn.yMm);
  };
  const better = (next: BestCell, best: BestCell | null): boolean => {
    if (best === null) return true;
    if (next.allMet !== best.allMet) return next.allMet;
    if (Math.abs(next.value - best.value) > SAME) return next.value > best.value;
    return distanceOf(next) < distanceOf(best);
  };

  function rows(rowFrom: number, rowTo: number): StandingRows {
    const values: number[] = [];
    const stances: number[] = [];
    let best: BestCell | null = null;
    for (let cell = rowFrom * grid.columns; cell < rowTo * grid.columns; cell += 1) {
      let here: BestCell | null = null;
      let isFree = false;
      for (let stance = 0; stance < turnsDeg.length * risersMm.length; stance += 1) {
        const place = placeOf(cell, stance);
        if (isBlocked(place)) continue;
        isFree = true;
        const { value, allMet } = worstAt(place);
        const next = { cell, stance, value, allMet };
        if (value >= 0 && better(next, here)) here = next;
      }
      values.push(here ? here.value : isFree ? NOT_REACHED : BLOCKED);
      stances.push(here ? here.stance : 0);
      if (here && better(here, best)) best = here;
    }
    return { values, stances, best };
  }

  function standAt(place: Placement & { riserMm: number }): Stand {
    const verdicts = points.map((point, index) => verdictAt(place, point, poses[index]));
    const conditions = verdicts.map(({ posture }) => posture?.inverseConditionNumber ?? null);
    return {
      xMm: place.xMm,
      yMm: place.yMm,
      angleDeg: place.angleDeg,
      riserMm: place.riserMm,
      worst: conditions.includes(null) ? null : Math.min(...conditions.map(Number)),
      reachedCount: verdicts.filter(({ reached }) => reached).length,
      metCount: verdicts.filter(({ met }) => met).length,
      blocked: isBlocked(place),
      points: verdicts.map(outcomeOf),
    };
  }

  function answer(slices: readonly StandingRows[]): StandingAnswer {
    const values = slices.flatMap((slice) => slice.values);
    const best = slices.reduce<BestCell | null>(
      (known, slice) => (slice.best && better(slice.best, known) ? slice.best : known),
      null,
    );
    return {
      study: 'standing',
      values: values.map((value) => (value < 0 ? value : Number(value.toFixed(5)))),
      stances: slices.flatMap((slice) => slice.stances),
      feasibleAreaM2: (values.filter((value) => value >= 0).length * grid.stepMm ** 2) / 1e6,
      drawn: standAt({ ...drawn, riserMm: robot.riserMm }),
      best: best && standAt(placeOf(best.cell, best.stance)),
    };
  }
  return { rows, answer };
}

/** A square about the origin: the floor that a base plate takes. */
export const squareMm = (halfMm: number): PointMm[] => [
  [-halfMm, -halfMm],
  [halfMm, -halfMm],
  [halfMm, halfMm],
  [-halfMm, halfMm],
];
