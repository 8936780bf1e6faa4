import { makeSolver } from '../solver';
import type { Arm, MapRequest } from '../types';

/**
 * What a spot of a map costs, counted in plain spots: one closed-form solution each. Measured: a roll that has to be searched takes dozens of
 * solutions, and so do the postures of a redundant arm; an arm without a closed form iterates; a cone asks once a direction.
 */
const SEARCHED_ROLL_WORK = 80;
const FAMILY_WORK = 14;
const SEARCHED_FAMILY_WORK = 200;
const NUMERICAL_WORK = 800;

export function mapWorkPerSpot(arm: Arm, request: MapRequest): number {
  return workPerDirection(arm, request) * (request.cone?.samples ?? 1);
}

function workPerDirection(arm: Arm, request: MapRequest): number {
  const { closedForm, toolOnLastAxis } = makeSolver(arm);
  if (!closedForm) return NUMERICAL_WORK;
  const searches = request.roll === 'free' && !toolOnLastAxis;
  if (closedForm.family) return searches ? SEARCHED_FAMILY_WORK : FAMILY_WORK;
  return searches ? SEARCHED_ROLL_WORK : 1;
}
