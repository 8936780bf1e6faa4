import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import net from 'node:net';

/** Services in the order of their ports, with the variable that sets each. */
const SERVICES = { web: 'WEB', db: 'DB', s3: 'S3', smtp: 'SMTP', mailbox: 'MAILBOX' };

/** True where nothing listens on the port and we could. */
export function portIsFree(port) {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host: '127.0.0.1', exclusive: true }, () => probe.close(() => resolve(true)));
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
 * A port a service: the environment's where it names one (ELBOWROOM_WEB_PORT, …), else the one of last time, else the checkout's own;
 * moved on where somebody else holds it. `held(service)` tells that the one who listens there is our own.
 */
export async function choosePorts(profile, held) {
  const known = existsSync(profile.portsFile) ? JSON.parse(readFileSync(profile.portsFile, 'utf8')) : {};
  const ports = {};
  let next = profile.firstPort;
  for (const [service, variable] of Object.entries(SERVICES)) {
    const name = `ELBOWROOM_${profile.isTest ? 'TEST_' : ''}${variable}_PORT`;
    const wanted = process.env[name];
    if (wanted !== undefined) {
      if (!/^\d+$/.test(wanted) || Number(wanted) < 1 || Number(wanted) > 65535)
        throw new Error(`${name}=${wanted} is no port: give a number from 1 to 65535.`);
      ports[service] = Number(wanted);
      if (!(await portIsFree(ports[service])) && !held(service))
        throw new Error(`Port ${wanted} (${name}) is taken by another program. Set another one.`);
      continue;
    }
    let port = known[service] ?? next;
    while (
      Object.values(ports).includes(port) ||
      (!(await portIsFree(port)) && !(held(service) && port === known[service]))
    )
      port = port >= 64000 ? 20000 : port + 17;
    ports[service] = port;
    next += 1;
  }
  writeFileSync(profile.portsFile, `${JSON.stringify(ports, null, 2)}\n`);
  return ports;
}
