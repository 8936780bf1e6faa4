import type { LayoutChanges } from '@/lib/contracts/layouts';
import type { Timer } from './autosave';
import type { Sheet } from './sheet';

export interface WatchPorts {
  /** Others' changes after a version of the layout; null where the server cannot be reached. */
  readonly ask: (since: number) => Promise<LayoutChanges | null>;
  readonly timer: Timer;
  /** Nobody looks at a hidden page. */
  readonly isAwake: () => boolean;
  readonly onChanges?: (changes: LayoutChanges) => void;
  /** Hands out a function that asks at once: word of a newer version came by another way. */
  readonly onReady?: (askNow: () => void) => void;
}

/** A colleague's edit is seen within two seconds. */
const ASK_EVERY_MS = 1500;
const LONGEST_WAIT_MS = 30_000;

/** Asks for others' changes again and again and merges them. Answers a function that ends it. */
export function watchChanges(sheet: Sheet, ports: WatchPorts): () => void {
  let ended = false;
  let waitMs = ASK_EVERY_MS;
  let cancel = ports.timer(turn, waitMs);
  let asking = false;

  async function turn(): Promise<void> {
    const { sync } = sheet.getState();
    // With a batch on its way an answer could be from before it or after it; the next turn knows.
    if (ports.isAwake() && !sync.inFlight) {
      asking = true;
      const changes = await ports.ask(sync.layoutVersion);
      asking = false;
      waitMs = changes ? ASK_EVERY_MS : Math.min(LONGEST_WAIT_MS, waitMs * 2);
      const isCurrent = sheet.getState().sync.exchanges === sync.exchanges;
      if (changes && isCurrent && !ended) {
        sheet.merge(changes);
        ports.onChanges?.(changes);
      }
    }
    if (!ended) cancel = ports.timer(turn, waitMs);
  }

  ports.onReady?.(() => {
    if (asking || ended) return;
    cancel();
    void turn();
  });

  return () => {
    ended = true;
    cancel();
  };
}
