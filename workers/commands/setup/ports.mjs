import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import { SetupError } from './shell.mjs';

/** Services in the order of their ports, with the variable that sets each. */
const SERVICES = { web: 'WEB', db: 'DB', s3: 'S3', smtp: 'SMTP', mailbox: 'MAILBOX' };

/** True where nobody listens on the port: `localhost` may lead a browser to either of the two addresses. */
export async function portIsFree(port) {
  return (await canListen(port, '127.0.0.1')) && (await canListen(port, '::1'));
}

function canListen(port, host) {
  return new Promise((resolve) => {
    const probe = net.createServer();
    // A machine without IPv6 cannot have anybody there.
    probe.once('error', ({ code }) => resolve(code !== 'EADDRINUSE' && code !== 'EACCES'));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

export function portAnswers(port) {
  return new Promise((resolve) => {
    const socket = net.connect({ port, host: '127.0.0.1' });
    const end = (answer) => {
      socket.destroy();
      resolve(answer);
    };
    socket.once('connect', () => end(true));
    socket.once('error', () => end(false));
    socket.setTimeout(1000, () => end(false));
  });
}

/**
 * A port for every service: the environment's where it names one (ELBOWROOM_WEB_PORT, …), else the one of last time, else the
 * checkout's own; moved on where somebody else listens on it.
 */
export async function choosePorts(profile) {
  const known = existsSync(profile.portsFile) ? JSON.parse(readFileSync(profile.portsFile, 'utf8')) : {};
  const ports = {};
  let own = profile.firstPort;
  for (const [service, variable] of Object.entries(SERVICES)) {
    const name = `ELBOWROOM_${profile.isTest ? 'TEST_' : ''}${variable}_PORT`;
    const taken = async (port) => Object.values(ports).includes(port) || !(await portIsFree(port));
    let port = known[service] ?? own;
    if (process.env[name]) {
      port = readPort(name);
      if (await taken(port))
        throw new SetupError(`Port ${port} (${name}) is taken by another program. Set another one.`);
    }
    while (await taken(port)) port = port >= 64_000 ? 20_000 : port + 17;
    ports[service] = port;
    own += 1;
  }
  writeFileSync(profile.portsFile, `${JSON.stringify(ports, null, 2)}\n`);
  return ports;
}

function readPort(name) {
  const words = process.env[name];
  const port = Number(words);
  if (/^\d+$/.test(words) && port >= 1 && port <= 65_535) return port;
  throw new SetupError(`${name}=${words} is no port: give a number from 1 to 65535.`);
}
