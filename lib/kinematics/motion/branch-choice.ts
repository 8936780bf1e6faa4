/** The cheapest way through layers of choices, and round again. */
export interface Choice {
  /** Index of the state taken in each layer. */
  readonly states: number[];
  readonly cost: number;
}

/** Cost of going from a state of one layer to a state of the next; Infinity where it cannot be done. */
export type StepCost = (layer: number, from: number, to: number) => number;

/**
 * The choice of one state a layer that makes the sum of all steps least: dynamic programming (Bellman 1957). `sizes`: states a layer.
 * With `closing`, the cost of going from a state of the last layer to one of the first is added, and the best round trip is found, by one
 * pass for each first state. Null where no way goes through.
 */
export function cheapestWay(
  sizes: readonly number[],
  stepCost: StepCost,
  closing?: (last: number, first: number) => number,
): Choice | null {
  if (sizes.length === 0 || sizes.some((size) => size === 0)) return null;
  if (!closing) return onePass(sizes, stepCost, null, () => 0);
  let best: Choice | null = null;
  for (let first = 0; first < sizes[0]; first++) {
    const found = onePass(sizes, stepCost, first, (last) => closing(last, first));
    if (found && (!best || found.cost < best.cost)) best = found;
  }
  return best;
}

function onePass(
  sizes: readonly number[],
  stepCost: StepCost,
  first: number | null,
  endCost: (last: number) => number,
): Choice | null {
  let costs = new Float64Array(sizes[0]).fill(first === null ? 0 : Infinity);
  if (first !== null) costs[first] = 0;
  const cameFrom: Int32Array[] = [];
  for (let layer = 0; layer + 1 < sizes.length; layer++) {
    const next = new Float64Array(sizes[layer + 1]).fill(Infinity);
    const from = new Int32Array(sizes[layer + 1]).fill(-1);
    for (let a = 0; a < sizes[layer]; a++) {
      if (costs[a] === Infinity) continue;
      for (let b = 0; b < next.length; b++) {
        const cost = costs[a] + stepCost(layer, a, b);
        if (cost < next[b]) [next[b], from[b]] = [cost, a];
      }
    }
    cameFrom.push(from);
    costs = next;
  }
  let end = -1;
  let cost = Infinity;
  costs.forEach((value, state) => {
    const whole = value + endCost(state);
    if (whole < cost) [cost, end] = [whole, state];
  });
  if (end < 0) return null;
  const states = [end];
  for (let layer = cameFrom.length - 1; layer >= 0; layer--) states.unshift(cameFrom[layer][states[0]]);
  return { states, cost };
}
