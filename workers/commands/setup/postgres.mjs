import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { portAnswers } from './ports.mjs';
import { postgresPrograms } from './packages.mjs';
import { lastLinesOf, run, SetupError, until } from './shell.mjs';

/**
 * A PostgreSQL of our own: one cluster a profile, on loopback only, without a unix socket, run by an unprivileged user.
 */

const DATABASE = 'elbowroom';

/** Command and arguments that run a PostgreSQL program as the user that may. */
function asPostgres(profile, program, args) {
  const file = path.join(postgresPrograms(), program);
  return profile.asRoot ? ['runuser', ['-u', 'postgres', '--', file, ...args]] : [file, args];
}

export function initialiseCluster(profile, password, say) {
  if (existsSync(path.join(profile.cluster, 'PG_VERSION'))) return;
  say('Initialising PostgreSQL');
  mkdirSync(path.dirname(profile.cluster), { recursive: true });
  // initdb reads the password from a file; it has to be readable by PostgreSQL's user and goes away at once.
  const secret = `${profile.cluster}.password`;
  writeFileSync(secret, password, { mode: 0o600 });
  try {
    if (profile.asRoot) run('chown', ['postgres:postgres', secret]);
    const args = [
      '-D',
      profile.cluster,
      '-U',
      DATABASE,
      '-A',
      'scram-sha-256',
      `--pwfile=${secret}`,
      '-E',
      'UTF8',
      '--locale=C.UTF-8',
    ];
    run(...asPostgres(profile, 'initdb', args));
  } finally {
    rmSync(secret, { force: true });
  }
}

export async function startCluster(profile, port, password) {
  const log = path.join(profile.cluster, 'server.log');
  // Durability is not asked of a test database, and the tests run in half the time without it.
  const careless = profile.isTest ? ' -c fsync=off -c synchronous_commit=off -c full_page_writes=off' : '';
  const options = `-p ${port} -c listen_addresses=127.0.0.1 -c unix_socket_directories='' -c max_connections=120${careless}`;
  const [command, args] = asPostgres(profile, 'pg_ctl', [
    '-D',
    profile.cluster,
    '-l',
    log,
    '-o',
    options,
    '-w',
    '-t',
    '60',
    'start',
  ]);
  try {
    run(command, args, { quiet: true });
  } catch (error) {
    throw new SetupError(`PostgreSQL does not start on port ${port}.\n${error.message}\n${lastLinesOf(log, 15)}`);
  }
  await until(() => portAnswers(port), { seconds: 20, words: () => `PostgreSQL does not answer on port ${port}.` });
  const databases = psql(profile, port, password, 'SELECT datname FROM pg_database', 'postgres');
  if (!databases.split('\n').includes(DATABASE))
    psql(profile, port, password, `CREATE DATABASE ${DATABASE}`, 'postgres');
}

export function resetDatabase(profile, port, password) {
  psql(profile, port, password, `DROP DATABASE IF EXISTS ${DATABASE} WITH (FORCE)`, 'postgres');
  psql(profile, port, password, `CREATE DATABASE ${DATABASE}`, 'postgres');
}

export function stopCluster(profile) {
  if (!clusterRuns(profile)) return;
  run(...asPostgres(profile, 'pg_ctl', ['-D', profile.cluster, '-m', 'fast', '-w', '-t', '60', 'stop']));
}

export function clusterRuns(profile) {
  if (!existsSync(path.join(profile.cluster, 'postmaster.pid'))) return false;
  try {
    run(...asPostgres(profile, 'pg_ctl', ['-D', profile.cluster, 'status']), { quiet: true });
    return true;
  } catch {
    return false;
  }
}

function psql(profile, port, password, statement, database) {
  const args = [
    '-h',
    '127.0.0.1',
    '-p',
    String(port),
    '-U',
    DATABASE,
    '-d',
    database,
    '-v',
    'ON_ERROR_STOP=1',
    '-Atc',
    statement,
  ];
  return run(path.join(postgresPrograms(), 'psql'), args, { env: { ...process.env, PGPASSWORD: password } });
}
