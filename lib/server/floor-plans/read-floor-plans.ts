import type { Transaction } from 'sequelize';
import type { FloorPlan as FloorPlanAnswer } from '@/lib/contracts/floor-plans';
import type { MemberActor } from '../policy';
import { findProject } from '../projects/data';
import { findFloorPlan, floorPlansOf } from './data';
import { presentFloorPlan } from './present';

export async function listFloorPlans(
  actor: MemberActor,
  projectId: string,
  transaction?: Transaction,
): Promise<FloorPlanAnswer[]> {
  const project = await findProject(actor, projectId, transaction);
  return (await floorPlansOf(project, transaction)).map(presentFloorPlan);
}

export async function readFloorPlan(
  actor: MemberActor,
  floorPlanId: string,
  transaction?: Transaction,
): Promise<FloorPlanAnswer> {
  return presentFloorPlan(await findFloorPlan(actor, floorPlanId, transaction));
}
