import { errorGain } from '@/lib/kinematics/measures/error-gain';
import { reach } from '@/lib/kinematics/reach';
import type { Arm } from '@/lib/kinematics/types';
import { bestOf, candidatesOf, worthOn } from '../bench';
import { frameOnFloor } from '../robot-frame';
import { targetInBase } from '../task-points';
import { toolDirection, toolOrientation } from '../tool-orientation';
import { NOT_REACHED, type ErrorGainAnswer } from './answer';
import type { ErrorGainQuestion } from './question';
import { studyBench } from './study-bench';

export interface ErrorGainRows {
  readonly values: readonly number[];
}

/**
 * At every spot of some rows the farthest that the tool point may be off (mm), to first order, where every joint is off by all
 * it may its own worst way: the longest Σ ± J_i e_i, in the posture that a map would take.
 */
export function errorGainRows(question: ErrorGainQuestion, arm: Arm, rowFrom: number, rowTo: number): ErrorGainRows {
  const { grid, robot, toolHeightMm, tiltDeg, rollDeg } = question;
  const bench = studyBench(question, arm);
  const { chain } = bench.solver;
  const errors = Array.from({ length: chain.actuators }, (_, k) =>
    chain.prismatic[k] === 1 && !chain.coupling
      ? question.slideErrorMm / 1000
      : (question.turnErrorDeg * Math.PI) / 180,
  );
  const values: number[] = [];
  for (let cell = rowFrom * grid.columns; cell < rowTo * grid.columns; cell += 1) {
    const xMm = grid.originMm[0] + (cell % grid.columns) * grid.stepMm;
    const yMm = grid.originMm[1] + Math.floor(cell / grid.columns) * grid.stepMm;
    const outward = (Math.atan2(yMm - robot.yMm, xMm - robot.xMm) * 180) / Math.PI;
    const direction = toolDirection(tiltDeg, question.towards === 'outward' ? outward : question.headingDeg);
    const pose = toolOrientation(direction, rollDeg === 'free' ? 0 : (rollDeg * Math.PI) / 180);
    const place = frameOnFloor({ xMm, yMm, angleDeg: 0 }, toolHeightMm);
    for (const axis of [3, 7, 11]) pose[axis] = place[axis];
    const candidates = candidatesOf(bench, reach(bench.solver, targetInBase({ rollDeg, pose }, robot), worthOn(bench)));
    if (candidates.length === 0) values.push(NOT_REACHED);
    else {
      const { posture } = bestOf(candidates, null);
      values.push(Number((errorGain(bench.solver.stand(posture), errors).shift.worst * 1000).toFixed(5)));
    }
  }
  return { values };
}

export function errorGainAnswer(slices: readonly ErrorGainRows[]): ErrorGainAnswer {
  const values = slices.flatMap((slice) => slice.values);
  const reached = values.filter((value) => value >= 0).sort((one, other) => one - other);
  const at = (share: number): number | null => reached[Math.round(share * (reached.length - 1))] ?? null;
  return { study: 'errorGain', values, least: at(0), median: at(0.5), most: at(1) };
}
