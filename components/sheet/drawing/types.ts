import type { LibraryArm } from '@/lib/contracts/arms';
import type { VerdictBand } from '@/lib/layout/verdict-words';
import type { FloorPoint, ScreenPoint } from '@/lib/layout/viewport';

/** Who looks: a planner who edits, a reader, or paper. Only `edit` listens to pointers on items. */
export type DrawingMode = 'edit' | 'share' | 'print';

/** What drawing a robot needs to know of its arm; arms of a snapshot and of the library both fit. */
export type DrawnArm = Pick<LibraryArm, 'id' | 'name' | 'reachMm' | 'definition'>;

/** The band a task point falls in; `unknown` while nothing has been computed. */
export type DrawnBand = VerdictBand | 'unknown';

/** A pointer on the sheet, in both frames, with the event behind it for keys and buttons. */
export interface SheetPointer {
  readonly floor: FloorPoint;
  readonly screen: ScreenPoint;
  readonly event: PointerEvent;
}
