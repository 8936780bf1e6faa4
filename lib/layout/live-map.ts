import { makeMapComputer } from '@/lib/kinematics/maps/compute-tile';
import { symmetryOf } from '@/lib/kinematics/maps/radial/symmetry';
import { mapWorkPerSpot } from '@/lib/kinematics/maps/work';
import { makeSolver } from '@/lib/kinematics/solver';
import type { Arm, MapTile } from '@/lib/kinematics/types';
import type { FloorGrid } from './floor-map';
import { gridInMm, mapRequestOf } from './map-question';
import type { MapQuestion } from './map-question-schema';
import { reachRadius } from './reach-radius';
import { armWithTool } from './robot-frame';

/** The map that follows the hand: the same question as the stored map's, on a grid coarse enough to be answered between two pictures. */

export interface LiveMapTask {
  readonly question: MapQuestion;
  /** As the library has it, without the tool. */
  readonly arm: Arm;
}

export interface LiveMap {
  readonly grid: FloorGrid;
  readonly tile: MapTile;
  /** Over the base plate: a map that follows the hand may be of a moment ago. */
  readonly toolHeightMm: number;
}

/** ms that one map may take. */
const BUDGET_MS = 24;
/** µs a plain spot, before anything has been measured: the full grid, and a profile over the radius. */
const FULL_GRID_US = 12;
const SYMMETRY_US = 1;
/** More cells than this are not computed live, however cheap: laying and painting them costs too. */
const MOST_CELLS = 22_000;
/** Fewer would say nothing. */
const LEAST_CELLS = 15 * 15;

/** A maker of live maps that learns what they cost on this machine. `now`: a clock in ms. */
export function makeLiveMapper(now: () => number): (task: LiveMapTask) => LiveMap {
  /** Measured µs a cell, by what decides it. */
  const costs = new Map<string, number>();
  return ({ question, arm }) => {
    const first = mapRequestOf(question, arm);
    const bySymmetry = symmetryOf(makeSolver(first.arm), first.request, -1) !== null;
    const work = bySymmetry ? 1 : mapWorkPerSpot(first.arm, first.request);
    const kind = JSON.stringify([question.armId, question.tool, question.settings, bySymmetry]);
    const usPerCell = costs.get(kind) ?? (bySymmetry ? SYMMETRY_US : FULL_GRID_US) * work;
    const stepMm = liveStepMm(question, arm, (BUDGET_MS * 1000) / usPerCell);
    const { arm: tooled, request } = mapRequestOf({ ...question, settings: { ...question.settings, stepMm } }, arm);
    const began = now();
    const tile = makeMapComputer(tooled, request).tile(0, request.grid.rows);
    const took = ((now() - began) * 1000) / (request.grid.rows * request.grid.columns);
    // The slower of the last two, so that one lucky map does not make the next one late.
    costs.set(kind, Math.max(took, 0.5 * (usPerCell + took)));
    return { grid: gridInMm(request.grid), tile, toolHeightMm: question.toolHeightMm };
  };
}

/** The step (whole mm, not below the question's own) with which the map stays within so many cells. */
export function liveStepMm(question: MapQuestion, arm: Arm, affordableCells: number): number {
  const cells = Math.min(MOST_CELLS, Math.max(LEAST_CELLS, affordableCells));
  const radiusMm = reachRadius(armWithTool(arm, question.tool)) * 1000;
  return Math.max(question.settings.stepMm, Math.ceil((2 * radiusMm) / (Math.sqrt(cells) - 2)));
}
