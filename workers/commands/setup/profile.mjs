import { createHash } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The checkout that these commands belong to, wherever they are called from. */
export const root = fileURLToPath(new URL('../../../', import.meta.url)).replace(/\/$/, '');

const hash = createHash('sha256').update(root).digest('hex');

/**
 * One installation on this machine: `demo` for `npm run up`, `test` for `npm test`. Everything that it owns bears the
 * checkout's hash, so that two checkouts, and a demo beside its tests, never meet.
 */
export function makeProfile(name) {
  const isTest = name === 'test';
  const data = path.join(root, '.data', name);
  const logs = path.join(data, 'logs');
  mkdirSync(logs, { recursive: true });
  const asRoot = process.getuid?.() === 0;
  // PostgreSQL refuses to run as root, and its own user cannot look into a checkout that only root may read. What belongs
  // to the cluster goes with it, or a cleaned checkout would meet a database whose password and pictures it has lost.
  const kept = asRoot ? `/var/lib/postgresql/elbowroom-${hash.slice(0, 10)}${isTest ? '-test' : ''}` : data;
  return {
    name,
    isTest,
    asRoot,
    /** Made anew at any time: logs, reports, mails, ports. */
    data,
    logs,
    /** Kept for good and only whole: database, pictures, secrets. */
    kept,
    cluster: path.join(kept, 'pg'),
    objects: path.join(kept, 's3'),
    secretsFile: path.join(kept, 'secrets.json'),
    accountsFile: path.join(data, 'demo-accounts.json'),
    portsFile: path.join(data, 'ports.json'),
    stateFile: path.join(data, 'running.json'),
    lockName: `elbowroom-${hash.slice(0, 16)}-${name}`,
    envFile: path.join(root, isTest ? '.env.test.local' : '.env.local'),
    distDir: isTest ? '.next-test' : '.next',
    // 20000 … 29990, below the ports that systems hand out to clients.
    firstPort: 20000 + (parseInt(hash.slice(0, 8), 16) % 990) * 10 + (isTest ? 5 : 0),
  };
}
