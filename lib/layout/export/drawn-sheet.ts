import type { Arm } from '@/lib/kinematics/types';
import type { Item } from '../items';
import type { WristMode } from '@/lib/kinematics/types';
import { judgeItems, type PointVerdict } from '../verdicts';
import { linework, type DrawnRobot, type Shape } from './linework';

/** A version of an arm as far as a drawing needs it. */
export interface SheetArm {
  readonly id: string;
  readonly reachMm: number;
  readonly definition: Arm;
}

export interface DrawnSheet {
  readonly verdicts: readonly PointVerdict[];
  readonly shapes: readonly Shape[];
}

/** Verdicts and linework of a sheet; each robot is drawn at the first task point that it serves best. */
export function drawnSheet(items: readonly Item[], arms: readonly SheetArm[], wrist: WristMode): DrawnSheet {
  const byId = new Map(arms.map((arm) => [arm.id, arm]));
  const verdicts = judgeItems(items, (armId) => byId.get(armId)?.definition, wrist);
  const robots = new Map<string, DrawnRobot>();
  for (const item of items) {
    const arm = item.kind === 'robot' ? byId.get(item.armId) : undefined;
    if (!arm) continue;
    const at = verdicts.find(({ best }) => best?.robotId === item.id && best.posture);
    robots.set(item.id, {
      definition: arm.definition,
      reachMm: arm.reachMm,
      posture: at?.best?.posture?.joints,
    });
  }
  return { verdicts, shapes: linework(items, robots) };
}
