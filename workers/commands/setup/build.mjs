import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
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
  'proxy.ts',
  'instrumentation-client.ts',
  'next.config.mjs',
  'postcss.config.mjs',
  'tailwind.config.ts',
  'tsconfig.json',
  'package-lock.json',
];
const IS_TEST = /\.test\.tsx?$/;

function fingerprint() {
  const hash = createHash('sha256').update(process.version);
  const add = (relative) => {
    const file = path.join(root, relative);
    if (!existsSync(file) || IS_TEST.test(relative)) return;
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
export async function buildWeb(profile, env, say) {
  const stamp = path.join(root, profile.distDir, 'elbowroom-sources');
  const sources = fingerprint();
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === sources) return;
  say('Building the web application');
  // Without its stamp, a build that is stopped half way is never taken for a whole one.
  rmSync(stamp, { force: true });
  await run(process.execPath, ['node_modules/next/dist/bin/next', 'build'], { env });
  writeFileSync(stamp, sources);
}
