import type { Handle, StepName } from '@/lib/layout/calibration-draft';

export const STEP_WORDS: Record<StepName, { title: string; body: string }> = {
  scale: {
    title: 'Known distance',
    body: 'Pick two points whose distance on the floor you know, as far apart as you can: a bay’s long side, two columns.',
  },
  check: {
    title: 'Check distance',
    body: 'Pick a second known distance, best across the first. It changes nothing; it tells how far the scale is off.',
  },
  level: {
    title: 'Level line',
    body: 'For a crooked scan: pick two points, left then right, on a line that runs level on the floor.',
  },
  origin: {
    title: 'Origin',
    body: 'Click the floor point that is x 0, y 0: a column, a corner of the bay. It starts in the lower left corner of the picture.',
  },
};

export const HANDLE_WORDS: Record<Handle, string> = {
  'scale.fromPx': 'First point of the known distance',
  'scale.toPx': 'Second point of the known distance',
  'check.fromPx': 'First point of the check distance',
  'check.toPx': 'Second point of the check distance',
  'level.fromPx': 'Left point of the level line',
  'level.toPx': 'Right point of the level line',
  origin: 'Origin',
};

/** What stands beside a point on the picture. */
export const HANDLE_MARKS: Record<Handle, string> = {
  'scale.fromPx': '1a',
  'scale.toPx': '1b',
  'check.fromPx': '2a',
  'check.toPx': '2b',
  'level.fromPx': '3a',
  'level.toPx': '3b',
  origin: '0',
};
