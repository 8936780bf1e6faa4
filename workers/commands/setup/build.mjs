import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { root } from './profile.mjs';
import { run } from './shell.mjs';

/** What the build is made of. */
const SOURCES = [
  'app',
  'components',
  'lib',
  'models',
  'public',
  'workers/jobs',
  'proxy.ts',
  'instrumentation-client.ts',
  'next.config.mjs',
  'postcss.config.mjs',
  'tailwind.config.ts',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
];

function fingerprint() {
  const hash = createHash('sha256').update(process.version);
  const add = (relative) => {
    const file = path.join(root, relative);
    if (!existsSync(file)) return;
    if (!statSync(file).isDirectory()) {
      hash.update(`\0${relative}\0`).update(readFileSync(file));
      return;
    }
    for (const entry of readdirSync(file).sort()) add(path.join(relative, entry));
  };
  SOURCES.forEach(add);
  return hash.digest('hex');
}

/** Builds the web application unless the last build was made of the same sources. */
export function buildWeb(profile, env, say) {
  const stamp = path.join(root, profile.distDir, 'elbowroom-sources');
  const sources = fingerprint();
  const whole = existsSync(path.join(root, profile.distDir, 'BUILD_ID'));
  if (whole && existsSync(stamp) && readFileSync(stamp, 'utf8') === sources) return;
  say('Building the web application');
  run(process.execPath, ['node_modules/next/dist/bin/next', 'build'], { env });
  writeFileSync(stamp, sources);
}
