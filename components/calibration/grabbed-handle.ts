import { handlesOf, pointOf, STEPS, type CalibrationDraft, type Handle } from '@/lib/layout/calibration-draft';
import { pictureToScreen } from '@/lib/layout/picture-view';
import type { ScreenPoint, Viewport } from '@/lib/layout/viewport';

/** How near a press must come to take hold of a point; a finger needs this much. */
const GRAB_PX = 20;

/** The picked point under a press, the nearest if there are several; null on bare picture. */
export function grabbedHandle(draft: CalibrationDraft, viewport: Viewport, at: ScreenPoint): Handle | null {
  let nearest: Handle | null = null;
  let least = GRAB_PX;
  for (const handle of STEPS.flatMap(handlesOf)) {
    const point = pointOf(draft, handle);
    if (!point) continue;
    const { x, y } = pictureToScreen(viewport, point);
    const distance = Math.hypot(x - at.x, y - at.y);
    if (distance >= least) continue;
    least = distance;
    nearest = handle;
  }
  return nearest;
}
