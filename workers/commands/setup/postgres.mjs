import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { postgresPrograms } from './packages.mjs';
import { run } from './shell.mjs';

/**
 * A PostgreSQL of our own: one cluster a profile, on loopback only, without a unix socket, run by an unprivileged user.
 */

const DATABASE = 'elbowroom';

/** Durability is not asked of a test database, and the tests run in half the time without it. */
const CARELESS = ['fsync=off', 'synchronous_commit=off', 'full_page_writes=off'];

function program(profile, name) {
  const version = path.join(profile.cluster, 'PG_VERSION');
  return path.join(postgresPrograms(existsSync(version) ? readFileSync(version, 'utf8').trim() : undefined), name);
}

/** How PostgreSQL's programs are run: as the user who may, in a folder that user may read, without our environment. */
function asItsUser(profile) {
  const env = { PATH: process.env.PATH, LC_ALL: 'C.UTF-8' };
  const id = (flag) => Number(spawnSync('id', [flag, 'postgres'], { encoding: 'utf8' }).stdout);
  const user = profile.asRoot ? { uid: id('-u'), gid: id('-g') } : undefined;
  return { env, user, cwd: profile.kept };
}

/** Makes the cluster where there is none. It gets its name last, so that an interrupted start leaves no half of one. */
export async function initialiseCluster(profile, password, say) {
  if (existsSync(profile.cluster)) return;
  say('Initialising PostgreSQL');
  const draft = `${profile.cluster}.new`;
  const secret = `${profile.cluster}.password`;
  rmSync(draft, { recursive: true, force: true });
  mkdirSync(draft, { mode: 0o700 });
  // initdb reads the password from a file; it has to be readable by PostgreSQL's user and goes away at once.
  writeFileSync(secret, password, { mode: 0o600 });
  try {
    if (profile.asRoot) await run('chown', ['postgres:postgres', draft, secret]);
    const args = ['-D', draft, '-U', DATABASE, '-A', 'scram-sha-256', `--pwfile=${secret}`, '-E', 'UTF8'];
    await run(program(profile, 'initdb'), [...args, '--locale=C.UTF-8'], asItsUser(profile));
  } finally {
    rmSync(secret, { force: true });
  }
  renameSync(draft, profile.cluster);
}

/** What to start, and how to stop it: an interrupt closes connections and shuts down, quit is the last resort. */
export function serverCommand(profile, port) {
  const settings = [
    `port=${port}`,
    'listen_addresses=127.0.0.1',
    'unix_socket_directories=',
    'max_connections=120',
    ...(profile.isTest ? CARELESS : []),
  ];
  return {
    command: program(profile, 'postgres'),
    args: ['-D', profile.cluster, ...settings.flatMap((setting) => ['-c', setting])],
    stop: { signal: 'SIGINT', lastSignal: 'SIGQUIT', patienceMs: 60_000 },
    ...asItsUser(profile),
  };
}

export async function serverIsReady(profile, port) {
  const args = ['-q', '-h', '127.0.0.1', '-p', String(port)];
  return run(program(profile, 'pg_isready'), args, { quiet: true }).then(
    () => true,
    () => false,
  );
}

/** Stops the server of this cluster that an earlier start has left behind. */
export async function stopLeftServer(profile) {
  const file = path.join(profile.cluster, 'postmaster.pid');
  if (!existsSync(file)) return;
  const pid = Number(readFileSync(file, 'utf8').split('\n', 1)[0]);
  // The file outlives a crash, and its number may be somebody else's by now.
  if (!commandLineOf(pid).includes(profile.cluster)) return;
  const args = ['-D', profile.cluster, '-m', 'fast', '-w', '-t', '60', 'stop'];
  await run(program(profile, 'pg_ctl'), args, asItsUser(profile));
}

function commandLineOf(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
  } catch {
    return [];
  }
}

export async function createDatabase(profile, port, password, { anew = false } = {}) {
  const psql = (statement) => {
    const where = ['-h', '127.0.0.1', '-p', String(port), '-U', DATABASE, '-d', 'postgres'];
    const env = { PATH: process.env.PATH, PGPASSWORD: password };
    return run(program(profile, 'psql'), [...where, '-X', '-v', 'ON_ERROR_STOP=1', '-Atc', statement], { env });
  };
  if (anew) await psql(`DROP DATABASE IF EXISTS ${DATABASE} WITH (FORCE)`);
  const names = await psql('SELECT datname FROM pg_database');
  if (!names.split('\n').includes(DATABASE)) await psql(`CREATE DATABASE ${DATABASE}`);
}
