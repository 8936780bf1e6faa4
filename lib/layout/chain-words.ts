import { FREEDOMS } from '@/lib/kinematics/freedoms';
import { makeSolver, type SolutionMethod } from '@/lib/kinematics/solver';
import type { Arm, Freedom } from '@/lib/kinematics/types';

const METHOD_WORDS: Record<SolutionMethod, string> = {
  'spherical wrist': 'Spherical wrist on a level base: solved in closed form, up to eight postures a point.',
  'parallel axes': 'Parallel axes with a quill: solved in closed form, up to two postures a point.',
  palletiser: 'Palletiser with a level flange: solved in closed form, up to four postures a point.',
  gantry: 'Three slides and a spherical wrist: solved in closed form, up to two postures a point.',
  'arm angle':
    'Seven axes: solved in closed form for each swing of the elbow, which is sampled and refined; up to eight postures a point and swing.',
  track:
    'Six axes on a slide: solved in closed form for each place of the slide, which is sampled and refined; up to eight postures a point and place.',
  numerical: 'No closed form is known for this chain: solved by iteration from several starts.',
};

const FREEDOM_WORDS: Record<Freedom, string> = {
  x: 'x',
  y: 'y',
  z: 'z',
  rx: 'turning about x',
  ry: 'turning about y',
  rz: 'turning about z',
};

/** How a chain is solved and what it controls, as sentences. */
export function sayChain(arm: Arm): { method: string; controls: string } {
  const { method, freedoms } = makeSolver(arm);
  const named = freedoms.map((row) => FREEDOM_WORDS[FREEDOMS[row]]);
  const controls =
    named.length === 6
      ? 'It controls the tool’s whole pose: three shifts and three turns.'
      : `It controls ${named.slice(0, -1).join(', ')}${named.length > 1 ? ' and ' : ''}${named.at(-1) ?? ''} of the tool; the rest follows.`;
  return { method: METHOD_WORDS[method], controls };
}
