import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { root } from './profile.mjs';

/** Runs one stage with its output kept back until it ends, so that stages beside one another do not mix. */
export async function stage(name, args, env) {
  const began = Date.now();
  const child = spawn(process.execPath, args, { cwd: root, env, stdio: ['ignore', 'pipe', 'pipe'] });
  let output = '';
  child.stdout.on('data', (part) => (output += part));
  child.stderr.on('data', (part) => (output += part));
  const code = await new Promise((resolve) => child.once('exit', resolve));
  const seconds = ((Date.now() - began) / 1000).toFixed(0);
  console.log(`\n── ${name}: ${code === 0 ? 'passed' : 'FAILED'} in ${seconds} s`);
  if (output.trim() && (code !== 0 || process.env.VERBOSE)) console.log(output.trim());
  return code === 0;
}

/** Tests passed and failed of a vitest or Playwright JSON report; a report that is missing counts as one failure. */
export function countsOf(file, kind) {
  if (!existsSync(file)) return { passed: 0, failed: 1 };
  const report = JSON.parse(readFileSync(file, 'utf8'));
  if (kind === 'vitest')
    return {
      passed: report.numPassedTests,
      failed: report.numFailedTests + (report.numFailedTestSuites > 0 && report.numFailedTests === 0 ? 1 : 0),
    };
  return { passed: report.stats.expected + report.stats.flaky, failed: report.stats.unexpected };
}
