import { mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { clearState, identityOf, readState, stillRuns, writeState } from './claim.mjs';
import { environmentOf, readSecrets, writeEnvFile } from './environment.mjs';
import { choosePorts, portAnswers } from './ports.mjs';
import { createDatabase, initialiseCluster, serverCommand, serverIsReady, stopLeftServer } from './postgres.mjs';
import { haltSteps, lastLinesOf, run, signalGroup, sleep, start, stopGroup, tellOfSteps, until } from './shell.mjs';

const script = (file) => ['--import', 'tsx', file];

/**
 * One profile's services: started in order, watched, and stopped in the reverse order, PostgreSQL last. Only what was started
 * here is ever stopped. The profile must have been claimed before.
 */
export class Installation {
  constructor(profile, say) {
    this.profile = profile;
    this.say = (words) => {
      this.note({ step: words });
      say(words);
    };
    this.children = new Map();
    this.stopping = false;
    this.values = { NEXT_DIST_DIR: profile.distDir };
    this.state = { left: leftBy(readState(profile)), children: {} };
    tellOfSteps((pids) => this.note({ steps: pids.map(identityOf) }));
    this.note({ step: 'Starting' });
  }

  /** Secrets, ports and the environment made of them, where services are wanted. Starts nothing. */
  async prepare({ services = true } = {}) {
    const { profile } = this;
    await this.clearLeftovers();
    if (!services) return;
    mkdirSync(profile.kept, { recursive: true, mode: profile.asRoot ? 0o711 : 0o700 });
    this.secrets = readSecrets(profile);
    this.ports = await choosePorts(profile);
    this.values = environmentOf(profile, this.ports, this.secrets);
    writeEnvFile(profile, this.values);
  }

  /** PostgreSQL, the object store and the mail server, and a migrated database in the first. `anew`: all of them empty. */
  async startServices({ anew = false } = {}) {
    const { profile, ports, secrets } = this;
    await initialiseCluster(profile, secrets.database, this.say);
    this.say('Starting PostgreSQL, the object store and the mail server');
    if (anew) rmSync(profile.objects, { recursive: true, force: true });
    this.startChild('postgresql', serverCommand(profile, ports.db));
    this.startNode('object-store', [
      'docker-less-s3-fake/server.mjs',
      ports.s3,
      profile.objects,
      this.values.S3_BUCKET,
    ]);
    const mails = path.join(profile.data, 'mails');
    this.startNode('mail-server', ['workers/stand-ins/smtp.mjs', ports.smtp, ports.mailbox, mails]);
    await this.answering('postgresql', () => serverIsReady(profile, ports.db));
    await this.answering('object-store', () => portAnswers(ports.s3));
    await this.answering('mail-server', () => portAnswers(ports.mailbox));
    await this.migrate({ anew });
  }

  async migrate({ anew = false } = {}) {
    await createDatabase(this.profile, this.ports.db, this.secrets.database, { anew });
    await run(process.execPath, script('workers/commands/migrate.ts'), { env: this.environment() });
  }

  async seed() {
    await run(process.execPath, script('workers/commands/seed.ts'), { env: this.environment() });
  }

  async startWeb(mode = 'production') {
    const { web } = this.ports;
    const next = ['node_modules/next/dist/bin/next', mode === 'production' ? 'start' : 'dev'];
    this.startNode('web', [...next, '-p', web, '-H', '127.0.0.1'], mode);
    await this.answering('web', () => portAnswers(web), 90);
    this.note({ address: this.values.APP_URL, mailbox: this.values.MAILBOX_URL });
  }

  startWorker(mode = 'production') {
    this.startNode('worker', script('workers/worker.ts'), mode);
  }

  /** The environment of everything that is started: this profile's values win over any .env file. */
  environment(mode = 'production') {
    return {
      ...process.env,
      ...this.values,
      NODE_ENV: mode,
      NEXT_TELEMETRY_DISABLED: '1',
      AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
    };
  }

  startNode(name, args, mode) {
    this.startChild(name, { command: process.execPath, args: args.map(String), env: this.environment(mode) });
  }

  startChild(name, { command, args, stop, ...options }) {
    if (this.stopping) return;
    const log = this.logOf(name);
    const child = start(command, args, { ...options, log, append: this.children.has(name) });
    this.children.set(name, { child, stop });
    this.note({ children: { ...this.state.children, [name]: identityOf(child.pid) } });
    child.once('error', (error) => this.onDeath?.(name, error.message, ''));
    child.once('exit', (code, signal) => {
      const ours = this.children.get(name)?.child === child;
      if (ours && !this.stopping) this.onDeath?.(name, code ?? signal, lastLinesOf(log, 12));
    });
  }

  logOf(name) {
    return path.join(this.profile.logs, `${name}.log`);
  }

  async answering(name, check, seconds = 60) {
    const words = () => `The ${name} does not answer.\n${lastLinesOf(this.logOf(name), 20)}`;
    await until(check, { seconds, words, child: this.children.get(name).child });
  }

  /** Ends what an earlier start has left running when it was killed itself. */
  async clearLeftovers() {
    const left = this.state.left.filter(stillRuns);
    for (const { pid } of left) signalGroup(pid, 'SIGTERM');
    const end = Date.now() + 20_000;
    while (left.some(stillRuns) && Date.now() < end) await sleep(100);
    for (const { pid } of left.filter(stillRuns)) signalGroup(pid, 'SIGKILL');
    await stopLeftServer(this.profile);
    this.note({ left: [] });
  }

  async stop() {
    if (this.stopping) return;
    this.stopping = true;
    await haltSteps();
    for (const { child, stop } of [...this.children.values()].reverse()) await stopGroup(child, stop);
    this.ended = true;
    clearState(this.profile);
  }

  /** Tells others how far this start has come. */
  note(news) {
    if (this.ended) return;
    this.state = { ...this.state, ...news };
    writeState(this.profile, this.state);
  }
}

/** What a start that was killed itself may have left running; its PostgreSQL is found and stopped by other means. */
function leftBy(state) {
  if (!state) return [];
  const { postgresql: _, ...children } = state.children ?? {};
  return [...(state.left ?? []), ...(state.steps ?? []), ...Object.values(children)];
}
