import { existsSync, readFileSync } from 'node:fs';
import { buildWeb } from './setup/build.mjs';
import { belongsHere, Installation, readState } from './setup/installation.mjs';
import { makeProfile } from './setup/profile.mjs';
import { SetupError, sleep } from './setup/shell.mjs';

/** `npm run up`: everything from a fresh machine to a running Elbowroom, then stays until Ctrl-C. `--dev`: with reloading. */

const mode = process.argv.includes('--dev') ? 'development' : 'production';
const profile = makeProfile('demo');
const say = (words) => console.log(`· ${words}`);

function announce(address, mailbox) {
  console.log(`\nElbowroom runs at ${address}`);
  if (mailbox) console.log(`Mails that it sends are kept at ${mailbox}`);
  if (existsSync(profile.accountsFile)) {
    console.log('\nDemo accounts');
    for (const { role, email, password, organisation } of JSON.parse(readFileSync(profile.accountsFile, 'utf8')))
      console.log(`  ${role.padEnd(11)} ${email.padEnd(34)} ${password.padEnd(22)} ${organisation}`);
  }
}

const running = readState(profile);
if (running && belongsHere(running.pid)) {
  announce(running.address);
  console.log('\nIt has been started before and still runs; nothing was started again.');
  process.exit(0);
}

const installation = new Installation(profile, say);

async function end(code) {
  if (installation.stopping) return;
  console.log('\n· Stopping');
  await installation.stop();
  process.exit(code);
}
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void end(0));

/** A worker may fall and is set up again, more slowly each time; without any other part there is nothing to go on with. */
let falls = 0;
installation.onDeath = async (name, how, words) => {
  console.error(`\nThe ${name} stopped by itself (${how}). Its last words:\n${words}`);
  if (name !== 'worker') return end(1);
  const pause = Math.min(60, 2 ** falls++);
  console.error(`It is started again in ${pause} s.`);
  await sleep(pause * 1000);
  if (!installation.stopping) installation.startWorker(mode);
};

try {
  await installation.prepare();
  say('Seeding the demo where it is missing');
  installation.seed();
  if (mode === 'production') buildWeb(profile, installation.environment(), say);
  say('Starting the web server and a worker');
  installation.startWorker(mode);
  await installation.startWeb(mode);
  announce(installation.env.APP_URL, installation.env.MAILBOX_URL);
  console.log('\nCtrl-C stops everything.');
} catch (error) {
  console.error(error instanceof SetupError ? `\n${error.message}` : error);
  await end(1);
}
