import { existsSync, readFileSync, readlinkSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { environmentOf, readSecrets, writeEnvFile } from './environment.mjs';
import { installDebianPackages, installNodePackages } from './packages.mjs';
import { choosePorts, portAnswers } from './ports.mjs';
import { initialiseCluster, resetDatabase, startCluster, stopCluster } from './postgres.mjs';
import { root } from './profile.mjs';
import { lastLinesOf, run, sleep, start, stopGroup, until } from './shell.mjs';

/**
 * One profile's services: started in order, watched, and stopped in the reverse order, PostgreSQL last. Only what was started here is
 * ever stopped.
 */
export class Installation {
  constructor(profile, say) {
    this.profile = profile;
    this.say = say;
    this.children = new Map();
    this.stopping = false;
  }

  /** Everything up to a migrated database, an object store and a mail server. */
  async prepare({ reset = false } = {}) {
    const { profile, say } = this;
    installNodePackages(say);
    installDebianPackages(say, { forTests: profile.isTest });
    await this.clearLeftovers();
    this.secrets = readSecrets(profile);
    this.ports = await choosePorts(profile, () => false);
    this.env = environmentOf(profile, this.ports, this.secrets);
    writeEnvFile(profile, this.env);
    initialiseCluster(profile, this.secrets.database, say);
    say('Starting PostgreSQL, the object store and the mail server');
    await startCluster(profile, this.ports.db, this.secrets.database);
    this.clusterStarted = true;
    if (reset) rmSync(path.join(profile.data, 's3'), { recursive: true, force: true });
    const { s3, smtp, mailbox } = this.ports;
    this.startChild('object-store', [
      'docker-less-s3-fake/server.mjs',
      String(s3),
      path.join(profile.data, 's3'),
      this.env.S3_BUCKET,
    ]);
    this.startChild('mail-server', [
      'workers/stand-ins/smtp.mjs',
      String(smtp),
      String(mailbox),
      path.join(profile.data, 'mails'),
    ]);
    await this.answering('object-store', s3);
    await this.answering('mail-server', mailbox);
    if (reset) resetDatabase(profile, this.ports.db, this.secrets.database);
    this.migrate();
  }

  migrate() {
    run(process.execPath, ['--import', 'tsx', 'workers/commands/migrate.ts'], { env: this.environment() });
  }

  async emptyDatabase() {
    resetDatabase(this.profile, this.ports.db, this.secrets.database);
    this.migrate();
  }

  seed() {
    run(process.execPath, ['--import', 'tsx', 'workers/commands/seed.ts'], { env: this.environment() });
  }

  /** The environment of everything that is started: this profile's values win over any .env file. */
  environment(mode = 'production') {
    return {
      ...process.env,
      ...this.env,
      NODE_ENV: mode,
      NEXT_TELEMETRY_DISABLED: '1',
      AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
    };
  }

  startChild(name, args, env = this.environment()) {
    const log = path.join(this.profile.logs, `${name}.log`);
    const child = start(process.execPath, args, { env, log, append: false });
    this.children.set(name, child);
    this.saveState();
    child.once('exit', (code, signal) => {
      if (!this.stopping && this.children.get(name) === child)
        this.onDeath?.(name, code ?? signal, lastLinesOf(log, 12));
    });
    return child;
  }

  async answering(name, port, seconds = 60) {
    const child = this.children.get(name);
    await until(() => portAnswers(port), {
      seconds,
      failed: () => child.exitCode !== null,
      words: () =>
        `The ${name} does not answer on port ${port}.\n${lastLinesOf(path.join(this.profile.logs, `${name}.log`), 20)}`,
    });
  }

  async startWeb(mode = 'production') {
    const next = [
      'node_modules/next/dist/bin/next',
      mode === 'production' ? 'start' : 'dev',
      '-p',
      String(this.ports.web),
      '-H',
      '127.0.0.1',
    ];
    this.startChild('web', next, this.environment(mode));
    await this.answering('web', this.ports.web, 90);
  }

  startWorker(mode = 'production') {
    this.startChild('worker', ['--import', 'tsx', 'workers/worker.ts'], this.environment(mode));
  }

  saveState() {
    const pids = [...this.children.values()].map((child) => child.pid);
    writeFileSync(this.profile.stateFile, JSON.stringify({ pid: process.pid, address: this.env.APP_URL, pids }));
  }

  /** What a start that was killed outright has left running: processes of this checkout that it had noted down. */
  async clearLeftovers() {
    const state = readState(this.profile);
    for (const pid of state?.pids ?? []) {
      if (!belongsHere(pid)) continue;
      try {
        process.kill(-pid, 'SIGTERM');
        await sleep(1500);
        if (belongsHere(pid)) process.kill(-pid, 'SIGKILL');
      } catch {
        // Gone already.
      }
    }
    stopCluster(this.profile);
  }

  async stop() {
    if (this.stopping) return;
    this.stopping = true;
    const order = [...this.children.keys()].reverse();
    for (const name of order) await stopGroup(this.children.get(name));
    if (this.clusterStarted) stopCluster(this.profile);
    rmSync(this.profile.stateFile, { force: true });
  }
}

export function readState(profile) {
  if (!existsSync(profile.stateFile)) return null;
  try {
    return JSON.parse(readFileSync(profile.stateFile, 'utf8'));
  } catch {
    return null;
  }
}

/** True where the process still runs in this checkout: numbers of processes are given out again. */
export function belongsHere(pid) {
  try {
    return readlinkSync(`/proc/${pid}/cwd`) === root;
  } catch {
    return false;
  }
}
