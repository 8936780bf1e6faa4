import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { makeMapComputer, type MapRoute } from '@/lib/kinematics/maps/compute-tile';
import { makeSolver } from '@/lib/kinematics/solver';
import type { Arm, MapRequest, WristMode } from '@/lib/kinematics/types';
import { milliseconds, perSecond, ratio, say, table, title } from './print';
import { interleaved, secondsOf } from './rounds';

/** Whole maps as the product makes them, tool down, all planes and reasons. */
export function mapOf(arm: Arm, side: number, wrist: WristMode, roll: number | 'free'): MapRequest {
  const reach = arm.joints.reduce((sum, { a, d }) => sum + Math.hypot(a, d), 0);
  return {
    grid: { origin: [-0.8 * reach, -0.8 * reach], step: (1.6 * reach) / side, columns: side, rows: side },
    toolHeight: 0.15 * reach,
    direction: { kind: 'down' },
    roll,
    wrist,
    branch: 'best',
  };
}

const run = (arm: Arm, request: MapRequest, route: MapRoute) => () =>
  secondsOf(() => makeMapComputer(arm, request, route).tile(0, request.grid.rows));

const medium = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;

export async function compareRoutes() {
  title(
    'Whole maps of a six-axis arm, tool down on the last axis, free roll, one thread: by symmetry, cell by cell, and by the general way',
  );
  const rows: string[][] = [];
  for (const side of [200, 500, 1000])
    for (const wrist of ['held', 'free'] as const) {
      const request = mapOf(medium, side, wrist, 'free');
      // The general way is too slow to wait for on the larger maps.
      const routes: MapRoute[] = side === 200 ? ['symmetry', 'full grid', 'reference'] : ['symmetry', 'full grid'];
      const times = await interleaved(routes.map((route) => ({ name: route, run: run(medium, request, route) })));
      const { difference, masks } = largestDifference(request);
      rows.push([
        `${side} × ${side}, wrist ${wrist}`,
        ...times.map(milliseconds),
        ...(times.length < 3 ? [''] : []),
        ratio(times[1] / times[0]),
        times.length < 3 ? '' : ratio(times[2] / times[1]),
        masks,
        difference.toExponential(1),
      ]);
    }
  table(
    ['', 'symmetry', 'full grid', 'general', 'symmetry is', 'full grid is', 'cells reached', 'largest difference'],
    rows,
  );
  say('"symmetry is" beside the full grid, "full grid is" beside the general way; difference as a share of the scale.');
}

function largestDifference(request: MapRequest) {
  const ours = makeMapComputer(medium, request, 'symmetry').tile(0, request.grid.rows);
  const full = makeMapComputer(medium, request, 'full grid').tile(0, request.grid.rows);
  const planes = ['inverseConditionNumber', 'maximumToolSpeed', 'sureSpeed', 'limitShare'] as const;
  let difference = 0;
  for (const plane of planes) {
    const speeds = plane === 'maximumToolSpeed' || plane === 'sureSpeed';
    const scale = speeds ? full[plane].reduce((most, value) => (value > most ? value : most), 0) : 1;
    full[plane].forEach((value, cell) => {
      if (full.reason[cell] === 0) difference = Math.max(difference, Math.abs(value - ours[plane][cell]) / scale);
    });
  }
  const masks = full.reason.every((reason, cell) => reason === ours.reason[cell]) ? 'the same' : 'DIFFERENT';
  return { difference, masks };
}

export async function growth() {
  title('Growth with grid points: six-axis, tool down, fixed roll, cell by cell');
  const sides = [100, 200, 316, 500, 1000];
  const times = await interleaved(
    sides.map((side) => ({ name: `${side}`, run: run(medium, mapOf(medium, side, 'held', 0), 'full grid') })),
  );
  table(
    ['points', 'time', 'µs a point', 'beside the first'],
    sides.map((side, i) => [
      perSecond(side * side),
      milliseconds(times[i]),
      ((times[i] * 1e6) / (side * side)).toFixed(3),
      ratio(times[i] / (side * side) / (times[0] / (sides[0] * sides[0]))),
    ]),
  );

  title('Growth with joints: a map of every built-in arm, 60 × 60, tool down, fixed roll');
  const arms = BUILT_IN_ARMS.map((entry) => ({ ...entry, request: mapOf(entry.arm, 60, 'held', 0) }));
  const byArm = await interleaved(
    arms.map(({ slug, arm, request }) => ({ name: slug, run: run(arm, request, 'auto') })),
  );
  table(
    ['arm', 'joints', 'solved by', 'time', 'µs a point'],
    arms.map(({ slug, arm }, i) => [
      slug,
      `${arm.joints.length}`,
      makeSolver(arm).method,
      milliseconds(byArm[i]),
      ((byArm[i] * 1e6) / 3600).toFixed(2),
    ]),
  );

  title('Growth with arms: maps of one to eight six-axis arms one after another, 200 × 200');
  const request = mapOf(medium, 200, 'held', 0);
  const counts = [1, 2, 4, 8];
  const byCount = await interleaved(
    counts.map((count) => ({
      name: `${count}`,
      run: () => Array.from({ length: count }, run(medium, request, 'full grid')).reduce((sum, time) => sum + time, 0),
    })),
  );
  table(
    ['arms', 'time', 'an arm beside the first'],
    counts.map((count, i) => [`${count}`, milliseconds(byCount[i]), ratio(byCount[i] / count / byCount[0])]),
  );
}
