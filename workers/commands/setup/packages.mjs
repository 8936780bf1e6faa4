import { existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { root } from './profile.mjs';
import { has, run, SetupError } from './shell.mjs';

/** npm packages as the lock file names them, unless they are there already. */
export function installNodePackages(say) {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 9))
    throw new SetupError(`Elbowroom needs Node 20.9 or newer; this is ${process.version}.`);
  const lock = path.join(root, 'package-lock.json');
  const done = path.join(root, 'node_modules', '.package-lock.json');
  if (existsSync(done) && statSync(done).mtimeMs >= statSync(lock).mtimeMs) return;
  // A fresh clone gives both files new times; what counts is whether the installed tree is the locked one.
  if (existsSync(done) && sameTree(lock, done)) return;
  say('Installing npm packages');
  run('npm', ['ci', '--no-audit', '--no-fund'], { hint: 'Is the npm registry reachable?' });
}

function sameTree(lock, done) {
  const versions = (file) => {
    const { packages } = JSON.parse(readFileSync(file, 'utf8'));
    return new Map(
      Object.entries(packages)
        .filter(([name]) => name !== '')
        .map(([name, { version }]) => [name, version]),
    );
  };
  const locked = versions(lock);
  const installed = versions(done);
  // Packages for other machines stay away, so the installed tree is a part of the locked one.
  return [...installed].every(([name, version]) => locked.get(name) === version) && installed.size > locked.size * 0.6;
}

const POSTGRES_BIN = '/usr/lib/postgresql';

/** Folder of PostgreSQL's programs, newest version first; null where the server is not installed. */
export function postgresPrograms() {
  for (let version = 30; version >= 13; version--) {
    const folder = `${POSTGRES_BIN}/${version}/bin`;
    if (existsSync(`${folder}/initdb`)) return folder;
  }
  return null;
}

/** Debian packages that are missing, through apt. `optional` ones are left out with a word where they cannot be had. */
export function installDebianPackages(say, { forTests }) {
  const missing = [];
  if (!postgresPrograms()) missing.push('postgresql');
  if (forTests && !has('chromium')) missing.push('chromium');
  if (missing.length > 0) {
    needApt(missing);
    // Debian would start a cluster of its own on the usual port.
    if (missing.includes('postgresql')) keepDebianFromMakingACluster();
    say(`Installing ${missing.join(', ')} from Debian`);
    run('apt-get', ['update'], { hint: 'Is a Debian mirror reachable?' });
    install(missing);
  }
  if (forTests) installReferenceLibraries(say);
}

/** The reference values are re-made where these are present; the committed file serves where they are not. */
function installReferenceLibraries(say) {
  const wanted = { 'python3-numpy': 'import numpy', 'python3-pykdl': 'import PyKDL' };
  const missing = Object.keys(wanted).filter((name) => !imports(wanted[name]));
  if (missing.length === 0 || process.getuid?.() !== 0 || !has('apt-get')) return;
  try {
    say(`Installing ${missing.join(', ')} from Debian`);
    run('apt-get', ['update'], { quiet: true });
    install(missing);
  } catch (error) {
    say(`Left out ${missing.join(', ')}: ${error.message.split('\n')[0]}`);
  }
}

function imports(statement) {
  try {
    run('/usr/bin/python3', ['-c', statement], { quiet: true });
    return true;
  } catch {
    return false;
  }
}

function needApt(missing) {
  if (process.getuid?.() === 0 && has('apt-get')) return;
  throw new SetupError(
    `Please install ${missing.join(' and ')} first, for instance: sudo apt-get install --no-install-recommends ${missing.join(' ')}`,
  );
}

function install(names) {
  run('apt-get', ['install', '-y', '--no-install-recommends', ...names], {
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
  });
}

function keepDebianFromMakingACluster() {
  const file = '/etc/postgresql-common/createcluster.conf';
  if (existsSync(file)) {
    const text = readFileSync(file, 'utf8');
    if (!/^\s*create_main_cluster\s*=\s*false/m.test(text))
      writeFileSync(file, `${text.replace(/^\s*create_main_cluster.*$/m, '')}\ncreate_main_cluster = false\n`);
    return;
  }
  mkdirSync(path.dirname(file), { recursive: true });
  writeFileSync(file, 'create_main_cluster = false\n');
}
