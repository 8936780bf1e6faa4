import type { Transaction } from 'sequelize';
import type { FloorPlan as FloorPlanAnswer, FloorPlanChange } from '@/lib/contracts/floor-plans';
import { calibrate, CalibrationFault } from '@/lib/layout/calibrate';
import type { Calibration, CalibrationRequest } from '@/lib/layout/calibration';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { invalid } from '../errors';
import type { MemberActor } from '../policy';
import { findFloorPlan } from './data';
import { presentFloorPlan } from './present';

function calibrated(request: CalibrationRequest): Calibration {
  try {
    return calibrate(request);
  } catch (error) {
    if (error instanceof CalibrationFault) throw invalid(`calibration.${error.path}`, error.message);
    throw error;
  }
}

/** Renames a floor plan or sets it to scale; issued revisions keep the scale that they were issued with. */
export async function changeFloorPlan(
  actor: MemberActor,
  floorPlanId: string,
  { name, calibration }: FloorPlanChange,
  outer?: Transaction,
): Promise<FloorPlanAnswer> {
  return inTransaction(async (transaction) => {
    const floorPlan = await findFloorPlan(actor, floorPlanId, transaction, { lock: true });
    if (name !== undefined) floorPlan.name = name;
    if (calibration !== undefined) floorPlan.calibration = calibration && calibrated(calibration);
    await floorPlan.save({ transaction });
    const details = {
      ...(name !== undefined && { name }),
      ...(calibration !== undefined && { scaled: calibration !== null }),
    };
    await recordAudit(actor, { action: 'floor_plan.changed', subjectId: floorPlanId, details }, transaction);
    return presentFloorPlan(floorPlan);
  }, outer);
}
