import { readdirSync, readFileSync, existsSync, statSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

const FOLDERS = ['app', 'components', 'lib', 'models', 'workers'];
const IMPORT = /(?:from|import)\s*\(?\s*'((?:@\/|\.)[^']*)'/g;
const TYPE_ONLY = /import type[^;]*?from\s*'[^']*';|export type[^;]*?from\s*'[^']*';/g;

function sources(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const file = path.join(folder, entry.name);
    if (entry.isDirectory()) return sources(file);
    return /(?<!\.test)\.tsx?$/.test(entry.name) ? [file] : [];
  });
}

function resolve(from: string, specifier: string): string | null {
  const base = specifier.startsWith('@/') ? specifier.slice(2) : path.join(path.dirname(from), specifier);
  const candidates = [base, `${base}.ts`, `${base}.tsx`, path.join(base, 'index.ts'), path.join(base, 'index.tsx')];
  return candidates.find((file) => existsSync(file) && statSync(file).isFile()) ?? null;
}

/** Imports that exist at run time; types vanish and may point either way. */
function importsOf(file: string): string[] {
  const text = readFileSync(file, 'utf8').replace(TYPE_ONLY, '');
  return [...text.matchAll(IMPORT)].map(([, specifier]) => resolve(file, specifier)).filter((found) => found !== null);
}

/** Every loop found by a walk in depth, as the files along it. */
function loops(graph: Map<string, string[]>): string[][] {
  const found: string[][] = [];
  const done = new Set<string>();
  const walk = (file: string, trail: string[]) => {
    if (trail.includes(file)) {
      found.push([...trail.slice(trail.indexOf(file)), file]);
      return;
    }
    if (done.has(file)) return;
    for (const next of graph.get(file) ?? []) walk(next, [...trail, file]);
    done.add(file);
  };
  for (const file of graph.keys()) walk(file, []);
  return found;
}

describe('the import graph', () => {
  const graph = new Map(FOLDERS.flatMap(sources).map((file) => [file, importsOf(file)]));

  it('is read at all', () => {
    expect(graph.size).toBeGreaterThan(100);
    expect([...graph.values()].flat().length).toBeGreaterThan(200);
  });

  it('would tell a loop', () => {
    expect(
      loops(
        new Map([
          ['a', ['b']],
          ['b', ['a']],
        ]),
      ),
    ).toHaveLength(1);
  });

  it('has no loop', () => {
    expect(loops(graph).map((loop) => loop.join(' → '))).toEqual([]);
  });
});
