import { existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { root } from './profile.mjs';
import { Halted, has, run, SetupError } from './shell.mjs';

/** npm packages as the lock file names them, unless they are there already. */
export async function installNodePackages(say) {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 9))
    throw new SetupError(`Elbowroom needs Node 20.9 or newer; this is ${process.version}.`);
  const lock = path.join(root, 'package-lock.json');
  const done = path.join(root, 'node_modules', '.package-lock.json');
  if (existsSync(done) && statSync(done).mtimeMs >= statSync(lock).mtimeMs) return;
  // Another branch and back gives the lock file a new time; what counts is whether the installed tree is the locked one.
  if (existsSync(done) && sameTree(lock, done)) return;
  say('Installing npm packages');
  await run('npm', ['ci', '--no-audit', '--no-fund'], { hint: 'Is the npm registry reachable?' });
}

function sameTree(lock, done) {
  const packagesOf = (file) =>
    Object.entries(JSON.parse(readFileSync(file, 'utf8')).packages).filter(([name]) => name !== '');
  const locked = packagesOf(lock);
  const installed = new Map(packagesOf(done).map(([name, { version }]) => [name, version]));
  // Optional packages for other machines stay away; none that is there may be another one.
  const right = ([name, { version, optional }]) =>
    installed.has(name) ? installed.get(name) === version : optional === true;
  const names = new Set(locked.map(([name]) => name));
  return locked.every(right) && [...installed.keys()].every((name) => names.has(name));
}

const POSTGRES_FOLDER = '/usr/lib/postgresql';

/** Folder of PostgreSQL's programs, of the version asked for or the newest; null where the server is not installed. */
export function postgresPrograms(wanted) {
  for (const version of [wanted, ...Array.from({ length: 18 }, (_, i) => 30 - i)]) {
    const folder = `${POSTGRES_FOLDER}/${version}/bin`;
    if (existsSync(`${folder}/initdb`)) return folder;
  }
  return null;
}

/** The Debian packages that nothing goes without, through apt where they are missing. */
export async function installDebianPackages(say, { database = true, browser = false } = {}) {
  const missing = [];
  if (database && !postgresPrograms()) missing.push('postgresql');
  if (browser && !has('chromium-headless-shell')) missing.push('chromium-headless-shell');
  if (missing.length === 0) return;
  if (!canInstall())
    throw new SetupError(
      `Please install ${missing.join(' and ')} first, for instance: sudo apt-get install --no-install-recommends ${missing.join(' ')}`,
    );
  // Debian would start a cluster of its own on the usual port.
  if (missing.includes('postgresql')) keepDebianFromMakingACluster();
  await install(missing, say);
}

/** What tests look deeper with where it can be had: reference values are made anew, printed pages are read. */
export async function installTestPackages(say) {
  if (!canInstall()) return;
  const missing = [];
  if (!(await imports('numpy'))) missing.push('python3-numpy');
  if (!(await imports('PyKDL'))) missing.push('python3-pykdl');
  if (!has('pdftotext')) missing.push('poppler-utils');
  if (missing.length === 0) return;
  try {
    await install(missing, say);
  } catch (error) {
    if (error instanceof Halted) throw error;
    say(`Left out ${missing.join(', ')}: ${error.message.split('\n')[0]}`);
  }
}

function imports(name) {
  return run('/usr/bin/python3', ['-c', `import ${name}`], { quiet: true }).then(
    () => true,
    () => false,
  );
}

const canInstall = () => process.getuid?.() === 0 && has('apt-get');

async function install(names, say) {
  say(`Installing ${names.join(', ')} from Debian`);
  await run('apt-get', ['update'], { hint: 'Is a Debian mirror reachable?' });
  await run('apt-get', ['install', '-y', '--no-install-recommends', '-o', 'DPkg::Lock::Timeout=300', ...names], {
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    // Stopped in the middle, it would leave packages half set up.
    mustFinish: true,
  });
}

function keepDebianFromMakingACluster() {
  const file = '/etc/postgresql-common/createcluster.conf';
  const text = existsSync(file) ? readFileSync(file, 'utf8') : '';
  if (/^\s*create_main_cluster\s*=\s*false/m.test(text)) return;
  mkdirSync(path.dirname(file), { recursive: true });
  writeFileSync(file, `${text.replace(/^\s*create_main_cluster.*$/m, '')}\ncreate_main_cluster = false\n`);
}
