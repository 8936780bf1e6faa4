import { mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { buildWeb } from './setup/build.mjs';
import { claim } from './setup/claim.mjs';
import { Installation } from './setup/installation.mjs';
import { onStop } from './setup/on-stop.mjs';
import { installDebianPackages, installNodePackages, installTestPackages } from './setup/packages.mjs';
import { makeProfile } from './setup/profile.mjs';
import { Halted, SetupError } from './setup/shell.mjs';
import { countsOf, stage } from './setup/stages.mjs';
import { readPlan } from './setup/test-plan.mjs';

/**
 * `npm test`: the same set-up as `npm run up` in a database and ports of its own, then every check.
 * `npm test -- lint|types|unit|components|integration|browser [files]` runs some; `--keep` leaves the services up until Ctrl-C.
 */

const plan = readPlan(process.argv.slice(2));
const profile = makeProfile('test');
const began = Date.now();
const total = { passed: 0, failed: 0 };

const other = await claim(profile);
if (other) {
  console.error(
    `Tests run in this checkout already (process ${other.pid ?? 'unknown'}), and two at once would empty each other's database. Wait for them, or stop them.`,
  );
  process.exit(1);
}

const installation = new Installation(profile, (words) => console.log(`· ${words}`));
const reports = path.join(profile.data, 'reports');
rmSync(reports, { recursive: true, force: true });
mkdirSync(reports, { recursive: true });

onStop(async () => {
  if (installation.stopping) return;
  await installation.stop();
  process.exit(130);
});

installation.onDeath = (name, how, words) => {
  total.failed += 1;
  console.log(`\n── ${name} stopped by itself (${how}). Its last words:\n${words}`);
};

const bin = {
  eslint: 'node_modules/eslint/bin/eslint.js',
  next: 'node_modules/next/dist/bin/next',
  playwright: 'node_modules/@playwright/test/cli.js',
  prettier: 'node_modules/prettier/bin/prettier.cjs',
  tsc: 'node_modules/typescript/bin/tsc',
  vitest: 'node_modules/vitest/vitest.mjs',
};

/** A check without tests of its own counts where it fails. */
async function check(name, args) {
  if (!(await stage(name, args, installation.environment()))) total.failed += 1;
}

async function test(kind, runner, args, env) {
  const report = path.join(reports, `${kind}.json`);
  const passed = await stage(`${kind} tests`, args(report), { ...installation.environment('test'), ...env(report) });
  const counts = countsOf(report, runner);
  total.passed += counts.passed;
  // A runner that fails without a failed test has failed all the same.
  total.failed += counts.failed || (passed ? 0 : 1);
}

async function readSources() {
  if (plan.wants('lint')) {
    await check('prettier', [bin.prettier, '--check', '--log-level=warn', '.']);
    await check('eslint', [bin.eslint, '--max-warnings=0', '.']);
  }
  if (plan.wants('types')) {
    await check('route types', [bin.next, 'typegen']);
    await check('types', [bin.tsc, '--noEmit']);
  }
}

async function build() {
  try {
    await buildWeb(profile, installation.environment(), installation.say);
    return true;
  } catch (error) {
    if (!(error instanceof SetupError)) throw error;
    total.failed += 1;
    console.log(`\n── build: FAILED\n${error.message}`);
    return false;
  }
}

async function runVitest(project) {
  if (!plan.wants(project)) return;
  const args = (report) =>
    [bin.vitest, 'run', '--project', project, '--reporter=default', '--reporter=json'].concat(
      `--outputFile.json=${report}`,
      plan.files,
    );
  await test(project, 'vitest', args, () => ({}));
}

async function runBrowser() {
  await installation.migrate({ anew: true });
  await installation.seed();
  installation.startWorker();
  await installation.startWeb();
  const args = () => [bin.playwright, 'test', ...plan.files];
  await test('browser', 'playwright', args, (report) => ({ PLAYWRIGHT_JSON_OUTPUT_FILE: report }));
}

try {
  await installNodePackages(installation.say);
  await installDebianPackages(installation.say, { database: plan.wantsServices, browser: plan.wants('browser') });
  if (plan.wantsTests) await installTestPackages(installation.say);
  await installation.prepare({ services: plan.wantsServices });
  if (plan.wantsServices) await installation.startServices({ anew: true });
  // Two cores: what reads the sources and the browser runs beside the other tests. The browser's stories begin with an empty
  // database, so they wait for the integration tests to be through with theirs.
  const integration = runVitest('integration');
  await Promise.all([
    readSources()
      .then(() => plan.wants('browser') && build())
      .then(async (built) => {
        await integration;
        if (built) await runBrowser();
      }),
    integration.then(() => runVitest('unit')).then(() => runVitest('components')),
  ]);
  if (plan.wantsTests && total.passed + total.failed === 0) {
    total.failed = 1;
    console.log('\nNo test was found.');
  }
  console.log(`\n${((Date.now() - began) / 1000).toFixed(0)} s in all`);
  console.log(`${total.passed} passed, ${total.failed} failed`);
  if (plan.keep) {
    console.log('\nThe services stay up; Ctrl-C stops them.');
    await new Promise(() => setInterval(() => {}, 60_000));
  }
} catch (error) {
  // A signal has stopped the stage, and its handler ends the rest.
  if (error instanceof Halted) await new Promise(() => {});
  console.error(error instanceof SetupError ? `\n${error.message}` : error);
  console.log(`${total.passed} passed, ${total.failed + 1} failed`);
  total.failed += 1;
}
await installation.stop();
process.exit(total.failed === 0 ? 0 : 1);
