import { execFile } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { promisify } from 'node:util';
import { ratio, say, table, title, milliseconds, perSecond } from './print';
import { interleaved, secondsOf } from './rounds';
import { makeWorkload, SIDE, type Kind, type Totals } from './workload';

/** The separate C++ program that runs the same workload; each kind of ours beside those of its kind. */

const BESIDE: Record<Kind, readonly string[]> = {
  T: ['b1.T.jac.tool', 'b1.T.fast.tool', 'b2.T.fast.share.tool'],
  TF: ['b1.TF.jac.tool', 'b1.TF.fast.tool', 'b2.TF.jac.share.tool'],
  TFP: ['b1.TFP.jac.tool', 'b1.TFP.fast.share.tool', 'b2.TFP.jac.share.tool'],
};

interface Printed extends Totals {
  readonly secs: number;
}

export function baseRateProgram(): string | null {
  const path = resolve(process.env.ELBOWROOM_BASE_RATE ?? '../shared/bench/base-rate');
  if (!existsSync(path)) {
    say('Left out: the C++ base program is not here. Name it in ELBOWROOM_BASE_RATE.');
    return null;
  }
  if (!readFileSync('/proc/cpuinfo', 'utf8').includes('avx512f')) {
    say('Left out: the C++ base program needs a processor with AVX-512.');
    return null;
  }
  return path;
}

export async function compareWithBaseRate() {
  title('Fixed workload, 40 000 spots, one thread: ours, and C++ scalar (b1) and eight at a time in AVX-512 (b2)');
  const program = baseRateProgram();
  for (const kind of ['T', 'TF', 'TFP'] as const) await oneKind(kind, program);
}

async function oneKind(kind: Kind, program: string | null) {
  const work = makeWorkload(kind);
  let ours = work();
  const printed = new Map<string, Printed>();
  const names = program ? BESIDE[kind] : [];
  const [seconds, ...bases] = await interleaved([
    { name: 'ours', run: () => secondsOf(() => (ours = work())) },
    ...names.map((name) => ({
      name,
      run: async () => {
        const { stdout } = await promisify(execFile)(program!, [name]);
        const line = JSON.parse(stdout) as Printed;
        printed.set(name, line);
        return line.secs;
      },
    })),
  ]);
  const row = (name: string, time: number, totals: Totals) => [
    name,
    milliseconds(time),
    perSecond((SIDE * SIDE) / time),
    time === seconds ? '' : ratio(time / seconds),
    `${totals.reach}`,
    `${totals.inlimit}`,
    `${totals.evals}`,
    totals.best.toPrecision(12),
    totals.ickT.toPrecision(12),
    totals.vmax.toPrecision(12),
    totals.vg.toPrecision(12),
  ];
  table(
    ['', 'time', 'spots/s', 'ours is', 'reached', 'in limits', 'evaluated', 'best', 'translational', 'fastest', 'sure'],
    [row(`${kind} ours`, seconds, ours), ...names.map((name, i) => row(name, bases[i], printed.get(name)!))],
  );
  const worst = Math.max(0, ...[...printed.values()].map((theirs) => difference(ours, theirs)));
  if (names.length > 0) say(`Largest relative difference of counts and sums: ${worst.toExponential(1)}`);
  if (worst > 1e-9) process.exitCode = 1;
}

/** Evaluations are not compared: a shared wrist flip counts once. */
function difference(ours: Totals, theirs: Totals): number {
  const fields = ['reach', 'inlimit', 'best', 'ickT', 'vmax', 'vg'] as const;
  return Math.max(...fields.map((field) => Math.abs(ours[field] / theirs[field] - 1)));
}
