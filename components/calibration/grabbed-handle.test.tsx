import { describe, expect, it } from 'vitest';
import { emptyDraft, withPoint } from '@/lib/layout/calibration-draft';
import { fitPicture, pictureToScreen } from '@/lib/layout/picture-view';
import { grabbedHandle } from './grabbed-handle';

const viewport = fitPicture({ widthPx: 800, heightPx: 600 }, { width: 800, height: 600 }, 0);
const draft = withPoint(
  withPoint(withPoint(emptyDraft(600), 'scale.fromPx', [100, 100]), 'check.fromPx', [100, 100]),
  'check.toPx',
  [112, 100],
);
const near = (xPx: number, yPx: number) => pictureToScreen(viewport, [xPx, yPx]);

describe('grabbedHandle', () => {
  it('takes the point of the open step where two lie on one spot', () => {
    expect(grabbedHandle({ draft, step: 'scale' }, viewport, near(101, 101))).toBe('scale.fromPx');
    expect(grabbedHandle({ draft, step: 'check' }, viewport, near(101, 101))).toBe('check.fromPx');
  });

  it('takes the nearest otherwise, and nothing on bare picture', () => {
    expect(grabbedHandle({ draft, step: 'origin' }, viewport, near(110, 100))).toBe('check.toPx');
    expect(grabbedHandle({ draft, step: 'scale' }, viewport, near(400, 300))).toBeNull();
  });
});
