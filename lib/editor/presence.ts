import type { OtherPlanner, PresenceAnswer, PresenceReport } from '@/lib/contracts/presence';
import type { Timer } from './autosave';
import { same } from './same';

export interface PresencePorts {
  /** Null where the server cannot be reached. */
  readonly report: (report: PresenceReport) => Promise<PresenceAnswer | null>;
  readonly timer: Timer;
  /** Nobody looks at a hidden page. */
  readonly isAwake: () => boolean;
  readonly seat: string;
  /** What is chosen on the sheet. */
  readonly chosenIds: () => readonly string[];
  /** The sheet on the server is at this version. */
  readonly onVersion: (layoutVersion: number) => void;
}

/** A colleague's cursor, and word of an edit, come within this time. */
const REPORT_EVERY_MS = 1000;
const LONGEST_WAIT_MS = 15_000;
const MOST_IDS = 50;
/** No sheet goes farther; the server refuses a cursor beyond, and with it the whole report. */
const FARTHEST_MM = 1_000_000;

/** Says again and again where this planner is, and holds where the others are. */
export class PresenceKeeper {
  private others: readonly OtherPlanner[] = [];
  private readonly listeners = new Set<() => void>();
  private at: PresenceReport['at'] = null;
  private waitMs = REPORT_EVERY_MS;
  private ended = false;
  private cancel: () => void;

  constructor(private readonly ports: PresencePorts) {
    this.cancel = ports.timer(() => void this.turn(), 0);
  }

  readonly getOthers = (): readonly OtherPlanner[] => this.others;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** The pointer is here on the floor; null: off the sheet. Sent with the next report. */
  readonly pointAt = (at: PresenceReport['at']): void => {
    const isOnSheet = at && Math.abs(at.xMm) <= FARTHEST_MM && Math.abs(at.yMm) <= FARTHEST_MM;
    this.at = isOnSheet ? at : null;
  };

  /** Ends it and gives the seat up. */
  stop(): void {
    if (this.ended) return;
    this.ended = true;
    this.cancel();
    void this.ports.report({ seat: this.ports.seat, at: null, itemIds: [], leaving: true });
  }

  private async turn(): Promise<void> {
    const { ports } = this;
    if (ports.isAwake()) {
      const itemIds = ports.chosenIds().slice(0, MOST_IDS);
      const answer = await ports.report({ seat: ports.seat, at: this.at, itemIds: [...itemIds] });
      if (this.ended) return;
      this.waitMs = answer ? REPORT_EVERY_MS : Math.min(LONGEST_WAIT_MS, this.waitMs * 2);
      // Without a line nobody knows where the others are: a cursor that stands still would tell a lie.
      this.show(answer?.others ?? []);
      if (answer) ports.onVersion(answer.layoutVersion);
    }
    if (!this.ended) this.cancel = ports.timer(() => void this.turn(), this.waitMs);
  }

  private show(others: readonly OtherPlanner[]): void {
    if (same(others, this.others)) return;
    this.others = others;
    for (const listener of [...this.listeners]) listener();
  }
}
