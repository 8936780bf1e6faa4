import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { countsOf } from './stages.mjs';
import { readPlan } from './test-plan.mjs';

describe('what is asked for', () => {
  const kinds = (...words) =>
    ['lint', 'types', 'unit', 'components', 'integration', 'browser'].filter(readPlan(words).wants);

  it('is everything without a word', () => {
    expect(kinds()).toEqual(['lint', 'types', 'unit', 'components', 'integration', 'browser']);
    expect(readPlan([])).toMatchObject({ keep: false, files: [], wantsTests: true, wantsServices: true });
  });

  it('needs no services and no tests for the checks of the sources', () => {
    expect(kinds('lint', 'types')).toEqual(['lint', 'types']);
    expect(readPlan(['lint'])).toMatchObject({ wantsTests: false, wantsServices: false });
    expect(readPlan(['unit'])).toMatchObject({ wantsTests: true, wantsServices: false });
    expect(readPlan(['unit', '--keep'])).toMatchObject({ keep: true, wantsServices: true });
  });

  it('is read off the files where no kind is named', () => {
    expect(kinds('lib/layout/geometry.test.ts')).toEqual(['unit']);
    expect(kinds('components/ui/button.test.tsx')).toEqual(['components']);
    expect(kinds('tests/integration/maps.test.ts', 'tests/browser/demo.spec.ts')).toEqual(['integration', 'browser']);
    expect(kinds('unit', 'integration/maps')).toEqual(['unit']);
  });
});

describe('the counts of a report', () => {
  let folder;
  beforeEach(() => {
    folder = mkdtempSync(path.join(tmpdir(), 'counts-'));
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  function counts(report, kind) {
    const file = path.join(folder, 'report.json');
    writeFileSync(file, JSON.stringify(report));
    return countsOf(file, kind);
  }

  it('tell of no test where there is no report', () => {
    expect(countsOf(path.join(folder, 'away.json'), 'vitest')).toEqual({ passed: 0, failed: 0 });
  });

  it('count a file of Vitest that cannot be loaded beside the tests that fail', () => {
    const failing = { status: 'failed', assertionResults: [{ status: 'passed' }, { status: 'failed' }] };
    const unread = { status: 'failed', message: 'Cannot find module', assertionResults: [] };
    const report = { numPassedTests: 5, numFailedTests: 1, testResults: [failing, unread] };
    expect(counts(report, 'vitest')).toEqual({ passed: 5, failed: 2 });
  });

  it('count what Playwright could not even begin', () => {
    const report = { stats: { expected: 3, unexpected: 1, flaky: 1, skipped: 0 }, errors: [{ message: 'no spec' }] };
    expect(counts(report, 'playwright')).toEqual({ passed: 4, failed: 2 });
  });
});
