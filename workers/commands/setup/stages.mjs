import { existsSync, readFileSync } from 'node:fs';
import { step } from './shell.mjs';

/** Runs one stage with its output kept back until it ends, so that stages beside one another do not mix. */
export async function stage(name, args, env) {
  const began = Date.now();
  const { code, output } = await step(process.execPath, args, { env });
  const seconds = ((Date.now() - began) / 1000).toFixed(0);
  console.log(`\n── ${name}: ${code === 0 ? 'passed' : 'FAILED'} in ${seconds} s`);
  if (output.trim() && (code !== 0 || process.env.VERBOSE)) console.log(output.trim());
  return code === 0;
}

/** Tests passed and failed of a Vitest or Playwright JSON report; one that is missing tells of none. */
export function countsOf(file, kind) {
  if (!existsSync(file)) return { passed: 0, failed: 0 };
  const report = JSON.parse(readFileSync(file, 'utf8'));
  return kind === 'vitest' ? vitestCounts(report) : playwrightCounts(report);
}

function vitestCounts({ numPassedTests, numFailedTests, testResults }) {
  // A file that cannot be loaded, or whose set-up fails, has no test that could.
  const unread = testResults.filter(
    ({ status, assertionResults }) =>
      status === 'failed' && !assertionResults.some((assertion) => assertion.status === 'failed'),
  );
  return { passed: numPassedTests, failed: numFailedTests + unread.length };
}

function playwrightCounts({ stats, errors }) {
  return { passed: stats.expected + stats.flaky, failed: stats.unexpected + errors.length };
}
