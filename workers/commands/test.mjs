import { mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { buildWeb } from './setup/build.mjs';
import { Installation } from './setup/installation.mjs';
import { makeProfile } from './setup/profile.mjs';
import { SetupError } from './setup/shell.mjs';
import { countsOf, stage } from './setup/stages.mjs';

/**
 * `npm test`: the same set-up as `npm run up` in a database and ports of its own, then every check.
 * `npm test -- unit|components|integration|browser [files]` runs one kind; `--keep` leaves the services up until Ctrl-C.
 */

const KINDS = ['lint', 'types', 'unit', 'components', 'integration', 'browser'];
const words = process.argv.slice(2);
const keep = words.includes('--keep');
const kinds = words.filter((word) => KINDS.includes(word));
const files = words.filter((word) => !KINDS.includes(word) && word !== '--keep');
const wants = (kind) => kinds.length === 0 || kinds.includes(kind);

const profile = makeProfile('test');
const installation = new Installation(profile, (text) => console.log(`· ${text}`));
const reports = path.join(profile.data, 'reports');
rmSync(reports, { recursive: true, force: true });
mkdirSync(reports, { recursive: true });
const began = Date.now();
const total = { passed: 0, failed: 0 };

for (const signal of ['SIGINT', 'SIGTERM'])
  process.on(signal, async () => {
    await installation.stop();
    process.exit(130);
  });

/** A check without tests of its own counts as failed where it fails. */
async function check(name, args, env) {
  if (!(await stage(name, args, env))) total.failed += 1;
}

async function vitest(project, env) {
  const report = path.join(reports, `${project}.json`);
  const args = [
    'node_modules/vitest/vitest.mjs',
    'run',
    '--project',
    project,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
    ...files,
  ];
  const passed = await stage(`${project} tests`, args, { ...env, NODE_ENV: 'test' });
  add(countsOf(report, 'vitest'), passed);
}

function add(counts, passed) {
  total.passed += counts.passed;
  // A runner that fails without a failed test has failed all the same.
  total.failed += counts.failed || (passed ? 0 : 1);
}

async function browser() {
  await installation.emptyDatabase();
  installation.seed();
  installation.startWorker();
  await installation.startWeb();
  const report = path.join(reports, 'browser.json');
  const env = { ...installation.environment('test'), PLAYWRIGHT_JSON_OUTPUT_NAME: report };
  const passed = await stage('browser tests', ['node_modules/@playwright/test/cli.js', 'test', ...files], env);
  add(countsOf(report, 'playwright'), passed);
}

const nextBin = 'node_modules/next/dist/bin/next';

try {
  await installation.prepare({ reset: true });
  const env = installation.environment();
  // Two cores: the checks that read the sources run beside the tests that mostly wait.
  await Promise.all([
    (async () => {
      if (wants('lint')) {
        await check('prettier', ['node_modules/prettier/bin/prettier.cjs', '--check', '--log-level=warn', '.'], env);
        await check('eslint', ['node_modules/eslint/bin/eslint.js', '--max-warnings=0', '.'], env);
      }
      if (wants('types')) {
        await check('route types', [nextBin, 'typegen'], env);
        await check('types', ['node_modules/typescript/bin/tsc', '--noEmit'], env);
      }
      if (wants('browser')) {
        try {
          buildWeb(profile, env, (text) => console.log(`· ${text}`));
        } catch (error) {
          total.failed += 1;
          console.log(`\n── build: FAILED\n${error.message}`);
        }
      }
    })(),
    (async () => {
      for (const project of ['unit', 'components', 'integration']) if (wants(project)) await vitest(project, env);
    })(),
  ]);
  if (wants('browser')) await browser();
  if (keep) {
    console.log('\nServices stay up for --keep; Ctrl-C stops them.');
    await new Promise(() => setInterval(() => {}, 60_000));
  }
} catch (error) {
  total.failed += 1;
  console.error(error instanceof SetupError ? `\n${error.message}` : error);
} finally {
  await installation.stop();
}

if (total.passed === 0) total.failed = Math.max(1, total.failed);
console.log(`\n${((Date.now() - began) / 1000).toFixed(0)} s in all`);
console.log(`${total.passed} passed, ${total.failed} failed`);
process.exit(total.failed === 0 ? 0 : 1);
