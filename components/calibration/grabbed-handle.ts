import {
  handlesOf,
  pointOf,
  STEPS,
  type CalibrationDraft,
  type Handle,
  type StepName,
} from '@/lib/layout/calibration-draft';
import { pictureToScreen } from '@/lib/layout/picture-view';
import type { ScreenPoint, Viewport } from '@/lib/layout/viewport';

/** How near a press must come to take hold of a point; a finger needs this much. */
const GRAB_PX = 20;
/** By how much a point of the open step may be farther and still win: lines often share a corner. */
const OPEN_STEP_LEAD_PX = 8;

/** The picked point under a press, of several the nearest or the open step's; null on bare picture. */
export function grabbedHandle(
  { draft, step }: { draft: CalibrationDraft; step: StepName },
  viewport: Viewport,
  at: ScreenPoint,
): Handle | null {
  let nearest: Handle | null = null;
  let least = GRAB_PX;
  for (const handle of STEPS.flatMap(handlesOf)) {
    const point = pointOf(draft, handle);
    if (!point) continue;
    const { x, y } = pictureToScreen(viewport, point);
    const away = Math.hypot(x - at.x, y - at.y);
    if (away >= GRAB_PX) continue;
    const distance = handlesOf(step).includes(handle) ? away - OPEN_STEP_LEAD_PX : away;
    if (distance >= least) continue;
    least = distance;
    nearest = handle;
  }
  return nearest;
}
