import { text } from 'node:stream/consumers';
import { analyse } from '@/lib/kinematics/analyse';
import { analyseRequestSchema } from '@/lib/contracts/analyse';
import { answerSequence } from '@/lib/layout/cycle/answer-sequence';

/** Reads one JSON question from standard input and prints one JSON answer; see README, "analyse". */

const BAD_INPUT = 2;

function refuse(path: string, message: string): never {
  process.stderr.write(`${JSON.stringify({ error: { path, message } })}\n`);
  process.exit(BAD_INPUT);
}

function pathOf(path: readonly PropertyKey[]): string {
  return path.map((part, i) => (typeof part === 'number' ? `[${part}]` : `${i ? '.' : ''}${String(part)}`)).join('');
}

function parse(input: string): unknown {
  if (input.trim() === '') refuse('', 'Nothing came on standard input. Pipe in a JSON object with an "arm".');
  try {
    return JSON.parse(input);
  } catch (error) {
    return refuse('', `Standard input is not JSON: ${(error as Error).message}`);
  }
}

const question = analyseRequestSchema.safeParse(parse(await text(process.stdin)));
if (!question.success) {
  const [first] = question.error.issues;
  refuse(pathOf(first.path), first.message);
}
try {
  const { arm, sequence } = question.data;
  const answers = { ...analyse(question.data), ...(sequence && { sequence: answerSequence(arm, sequence.steps) }) };
  process.stdout.write(`${JSON.stringify(answers)}\n`);
} catch (error) {
  // The kernel refuses what no schema can see, such as a branch that this arm does not have.
  if (error instanceof RangeError) refuse('map.branch', error.message);
  throw error;
}
