import { makeBench } from '../bench';
import type { Item } from '../items';
import type { ArmOf } from '../judging/cell-judge';
import { makeMemory } from '../judging/memory';
import { cellCycle, type CellCycle } from './cell-cycle';
import { estimateCycle, type CycleEstimate } from './estimate';

export interface CellCycles {
  readonly estimates: readonly CycleEstimate[];
  /** The robots against one another. */
  readonly cell: CellCycle;
}

/** Times the cycles of a sheet again and again; a robot is timed anew only where it, or something that it goes to, has changed. */
export function makeCycleJudge(): (items: readonly Item[], armOf: ArmOf) => CellCycles {
  const memory = makeMemory<CycleEstimate>();
  return (items, armOf) => {
    const byId = new Map(items.map((item) => [item.id, item]));
    const estimates = items.flatMap((item): CycleEstimate[] => {
      const arm = item.kind === 'robot' ? armOf(item.armId) : undefined;
      if (item.kind !== 'robot' || !arm || item.sequence.length === 0) return [];
      const visited = item.sequence.map((step) =>
        step.kind === 'zone' ? byId.get(step.zoneId)?.name : 'fixtureId' in step ? byId.get(step.fixtureId) : null,
      );
      return [
        memory.recall(item.id, [item, arm, ...visited], () => estimateCycle(makeBench(item, arm, 'held'), items)),
      ];
    });
    memory.settle();
    const robots = items.filter((item) => item.kind === 'robot');
    const sequences = new Map(robots.map(({ id, sequence }) => [id, sequence]));
    const zones = new Map(items.flatMap(({ kind, id, name }) => (kind === 'zone' ? [[id, name] as const] : [])));
    return { estimates, cell: cellCycle(estimates, sequences, zones) };
  };
}

/** For one look. */
export function judgeCycles(items: readonly Item[], armOf: ArmOf): CellCycles {
  return makeCycleJudge()(items, armOf);
}
