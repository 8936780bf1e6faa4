import { existsSync, readFileSync } from 'node:fs';
import { buildWeb } from './setup/build.mjs';
import { claim } from './setup/claim.mjs';
import { Installation } from './setup/installation.mjs';
import { onStop } from './setup/on-stop.mjs';
import { installDebianPackages, installNodePackages } from './setup/packages.mjs';
import { makeProfile } from './setup/profile.mjs';
import { Halted, SetupError, sleep } from './setup/shell.mjs';

/** `npm run up`: everything from a fresh machine to a running Elbowroom, then stays until Ctrl-C. `--dev`: with reloading. */

/** A worker that ran this long was in order; its next fall is a first one again. */
const STEADY_MS = 60_000;

const mode = process.argv.includes('--dev') ? 'development' : 'production';
const profile = makeProfile('demo');

const other = await claim(profile);
if (other) {
  if (other.address) announce(other);
  const who = other.pid ? `process ${other.pid}` : 'another process';
  console.log(
    other.address
      ? `\nIt runs already (${who}); nothing was started again.`
      : `Elbowroom is being started already by ${who}, which is at: ${other.step ?? 'the beginning'}. It will say there when it is ready.`,
  );
  process.exit(0);
}

const installation = new Installation(profile, (words) => console.log(`· ${words}`));

async function end(code) {
  if (installation.stopping) return;
  console.log('\n· Stopping');
  await installation.stop();
  process.exit(code);
}
onStop(() => end(0));

let falls = 0;
let workerStarted = 0;

function startWorker() {
  workerStarted = Date.now();
  installation.startWorker(mode);
}

/** A worker may fall and is set up again, more slowly each time; without any other part there is nothing to go on with. */
installation.onDeath = async (name, how, words) => {
  console.error(`\nThe ${name} stopped by itself (${how}). Its last words:\n${words}`);
  if (name !== 'worker') return end(1);
  if (Date.now() - workerStarted > STEADY_MS) falls = 0;
  const pause = Math.min(60, 2 ** falls++);
  console.error(`It is started again in ${pause} s.`);
  await sleep(pause * 1000);
  startWorker();
};

function announce({ address, mailbox }) {
  console.log(`\nElbowroom runs at ${address}`);
  console.log(`Mails that it sends are kept at ${mailbox}`);
  if (!existsSync(profile.accountsFile)) return;
  console.log('\nDemo accounts');
  for (const { role, email, password, organisation } of JSON.parse(readFileSync(profile.accountsFile, 'utf8')))
    console.log(`  ${role.padEnd(11)} ${email.padEnd(34)} ${password.padEnd(22)} ${organisation}`);
}

try {
  await installNodePackages(installation.say);
  await installDebianPackages(installation.say);
  await installation.prepare();
  await installation.startServices();
  installation.say('Seeding the demo where it is missing');
  await installation.seed();
  if (mode === 'production') await buildWeb(profile, installation.environment(), installation.say);
  installation.say('Starting the web server and a worker');
  startWorker();
  await installation.startWeb(mode);
  announce(installation.state);
  console.log('\nCtrl-C stops everything.');
} catch (error) {
  // A signal has stopped the step, and its handler ends the rest.
  if (!(error instanceof Halted)) {
    console.error(error instanceof SetupError ? `\n${error.message}` : error);
    await end(1);
  }
}
