import type { Arm } from '@/lib/kinematics/types';
import { makeBench, type Bench } from '../bench';
import { robotSchema } from '../items';
import type { RobotVerdict } from '../judging/point-verdict';
import type { PointOutcome } from './answer';
import type { StudyQuestion } from './question';

/** No robot of a sheet: a study names none. */
const NOBODY = '00000000-0000-4000-8000-000000000002';

/** The robot of a study, made ready to be asked; the same bench as verdicts use, so that both say the same. */
export function studyBench({ armId, tool, robot, wrist }: StudyQuestion, arm: Arm): Bench {
  return makeBench(robotSchema.parse({ kind: 'robot', id: NOBODY, name: 'R', armId, ...robot, tool }), arm, wrist);
}

export function outcomeOf({ band, reached, met, posture }: RobotVerdict): PointOutcome {
  return {
    band,
    reached,
    met,
    inverseConditionNumber: posture?.inverseConditionNumber ?? null,
    sureSpeedMmS: posture?.sureSpeedMmS ?? null,
  };
}
