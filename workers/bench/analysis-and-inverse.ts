import { makeBranchPairs } from '@/lib/kinematics/fast/branch-pairs';
import { makeDescent } from '@/lib/kinematics/inverse/descent';
import { singularValues } from '@/lib/kinematics/measures/singular-values';
import { makePostureAnalyser } from '@/lib/kinematics/posture';
import { middleCopy } from '@/lib/kinematics/reach';
import { makeSolver } from '@/lib/kinematics/solver';
import { WORKLOAD_ARM } from '@/lib/kinematics/testing/grid-workload';
import { randomPosture, seededRandom } from '@/lib/kinematics/testing/random';
import { poseOf, type Transform } from '@/lib/kinematics/transforms';
import { perSecond, ratio, say, table, title } from './print';
import { startPythonPeer } from './python-peer';
import { interleaved, secondsOf, type Contender } from './rounds';
import { downwards, LENGTH_M, placeTool, SIDE } from './workload';

const POSTURES = 20_000;
const TARGETS = 400;
const STARTS = 8;
/** rad: how far a warm start stands from a solution, about what a neighbouring spot of a 5 cm grid asks of a joint. */
const WARM = 0.05;

/** Reachable poses of the workload with a start near one of their solutions. */
function makeTargets() {
  const solver = makeSolver(WORKLOAD_ARM);
  const random = seededRandom(11);
  const tool = downwards();
  const posture = new Float64Array(6);
  const targets: Transform[] = [];
  const warm: number[][] = [];
  while (targets.length < TARGETS) {
    placeTool(tool, Math.floor(random() * SIDE * SIDE));
    const branches = solver.closedForm!.solve(solver.flangeOf(tool), 0);
    if (branches.count === 0 || !middleCopy(solver, branches.values, 0, posture)) continue;
    targets.push(tool.slice());
    warm.push(Array.from(posture, (value) => value + WARM * (2 * random() - 1)));
  }
  const starts = Array.from({ length: STARTS }, () => randomPosture(solver.chain, random));
  const postures = Array.from({ length: POSTURES }, () => randomPosture(solver.chain, random));
  return { solver, targets, warm, starts, postures };
}

export async function compareAnalysisAndInverse() {
  const { solver, targets, warm, starts, postures } = makeTargets();
  const peer = await startPythonPeer({
    arm: WORKLOAD_ARM,
    lengthM: LENGTH_M,
    postures,
    targets: targets.map(poseOf),
    starts,
    warm,
  });
  await analysis(solver, postures, peer);
  await inverse(solver, targets, starts, warm, peer);
  peer?.close();
}

type Peer = Awaited<ReturnType<typeof startPythonPeer>>;
type Solver = ReturnType<typeof makeSolver>;

async function analysis(solver: Solver, postures: number[][], peer: Peer) {
  title(`Posture analysis, ${perSecond(POSTURES)} postures, one thread`);
  const { maxSpeed } = solver.chain;
  const linear = new Float64Array(18);
  const whole = new Float64Array(36);
  const values = new Float64Array(6);
  const analyse = makePostureAnalyser(WORKLOAD_ARM);
  const contenders: Contender[] = [
    {
      name: 'ours: pose, Jacobian, singular values of both blocks',
      run: () =>
        secondsOf(() => {
          for (const posture of postures) {
            const matrix = solver.stand(posture);
            for (let row = 0; row < 6; row++)
              for (let i = 0; i < 6; i++)
                whole[6 * row + i] = matrix[6 * row + i] * maxSpeed[i] * (row < 3 ? 1 : LENGTH_M);
            linear.set(whole.subarray(0, 18));
            singularValues(linear, 3, 6, values);
            singularValues(whole, 6, 6, values);
          }
        }),
    },
    {
      name: 'ours: every measure, wrist held and free, exact polytopes',
      run: () =>
        secondsOf(() => {
          for (const posture of postures) analyse(posture);
        }),
    },
  ];
  if (peer?.has.includes('numpy'))
    contenders.push({
      name: 'numpy, all postures at once: as the first line',
      run: async () => (await peer.run('numpy')).seconds,
    });
  else say('Left out: numpy (Debian: python3-numpy).');
  const seconds = await interleaved(contenders);
  table(
    ['', 'postures/s', 'first line is'],
    contenders.map(({ name }, i) => [name, perSecond(POSTURES / seconds[i]), i ? ratio(seconds[i] / seconds[0]) : '']),
  );
}

async function inverse(solver: Solver, targets: Transform[], starts: number[][], warm: number[][], peer: Peer) {
  title(`Inverse kinematics, ${TARGETS} reachable poses, one thread`);
  const pairs = makeBranchPairs(solver.chain, false)!;
  const descend = makeDescent(solver.chain, [0, 1, 2, 3, 4, 5], false);
  const found = { starts: 0, warm: 0, kdlStarts: 0, kdlWarm: 0 };
  const u = new Float64Array(6);
  /** Closed forms are so quick that many rounds of all targets make one measurement. */
  const REPEATS = 50;
  const repeated = (work: () => void) => secondsOf(() => Array.from({ length: REPEATS }, work)) / REPEATS;
  const contenders: Contender[] = [
    {
      name: 'ours: closed form, all branches, as angles',
      run: () =>
        repeated(() => {
          for (const target of targets) solver.closedForm!.solve(solver.flangeOf(target), 0);
        }),
    },
    {
      name: 'ours: all branches, as map loops take them',
      run: () =>
        repeated(() => {
          for (const target of targets) {
            pairs.orient(target);
            pairs.solve(target);
          }
        }),
    },
    {
      name: `ours: damped least squares, ${STARTS} starts`,
      run: () =>
        secondsOf(() => {
          found.starts = 0;
          for (const target of targets) {
            let arrived = false;
            for (const start of starts) {
              u.set(start);
              if (descend(u, target, false).stop === 'found') arrived = true;
            }
            if (arrived) found.starts++;
          }
        }),
    },
    {
      name: 'ours: damped least squares, one warm start',
      run: () =>
        secondsOf(() => {
          found.warm = 0;
          targets.forEach((target, i) => {
            u.set(warm[i]);
            if (descend(u, target, false).stop === 'found') found.warm++;
          });
        }),
    },
  ];
  if (peer?.has.includes('kdl starts')) {
    const kdl = async (job: string, field: 'kdlStarts' | 'kdlWarm') => {
      const { seconds, done } = await peer.run(job);
      found[field] = done;
      return seconds;
    };
    contenders.push(
      { name: `KDL, Levenberg-Marquardt, ${STARTS} starts`, run: () => kdl('kdl starts', 'kdlStarts') },
      { name: 'KDL, Levenberg-Marquardt, one warm start', run: () => kdl('kdl warm', 'kdlWarm') },
    );
  } else say('Left out: KDL (Debian: python3-pykdl).');
  const seconds = await interleaved(contenders);
  const arrived = [TARGETS, TARGETS, found.starts, found.warm, found.kdlStarts, found.kdlWarm];
  table(
    ['', 'poses/s', 'first line is', 'second line is', 'poses solved'],
    contenders.map(({ name }, i) => [
      name,
      perSecond(TARGETS / seconds[i]),
      i ? ratio(seconds[i] / seconds[0]) : '',
      i > 1 ? ratio(seconds[i] / seconds[1]) : '',
      `${arrived[i]} of ${TARGETS}`,
    ]),
  );
}
