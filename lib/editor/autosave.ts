import type { OperationBatch, OperationResult, StoredItem } from '@/lib/contracts/layouts';
import type { KeptEdits } from './kept-edits';
import type { Sheet } from './sheet';
import { differences, waiting } from './sync';

/** What became of a batch, as the transport saw it. */
export type SendAnswer =
  | { readonly kind: 'accepted'; readonly result: OperationResult }
  | { readonly kind: 'stale'; readonly conflicts: readonly { itemId: string; current: StoredItem | null }[] }
  /** The server understood and will not have it; sending it again is no use. */
  | { readonly kind: 'refused'; readonly message: string }
  /** No answer, or a server in trouble: nobody knows whether it was applied. */
  | { readonly kind: 'unreachable'; readonly message: string };

/** Runs `action` after so many milliseconds; the answer cancels it. */
export type Timer = (action: () => void, afterMs: number) => () => void;

export interface AutosavePorts {
  readonly send: (batch: OperationBatch) => Promise<SendAnswer>;
  readonly keep: (edits: KeptEdits | null) => void;
  readonly timer: Timer;
  readonly newId: () => string;
}

export interface SaveStatus {
  readonly state: 'saved' | 'saving' | 'offline' | 'conflict' | 'refused';
  /** What is wrong and what happens next, in words; null while nothing is. */
  readonly detail: string | null;
}

/** Edits in quick succession travel together. */
const DEBOUNCE_MS = 500;
const FIRST_RETRY_MS = 1000;
const LONGEST_RETRY_MS = 30_000;

/**
 * Saves a sheet by itself: watches it, sends what differs from the server in batches, one at a time. A batch without an
 * answer is sent again under the same id until there is one. Whatever waits is kept where a reload finds it.
 */
export class Autosave {
  private status: SaveStatus = { state: 'saved', detail: null };
  private readonly listeners = new Set<() => void>();
  private cancelTimer: (() => void) | null = null;
  private retryMs = FIRST_RETRY_MS;
  private trouble: { state: 'offline' | 'refused'; detail: string } | null = null;
  private seen: { items: unknown; sync: unknown } = { items: null, sync: null };
  private sending = false;
  private stopped = false;
  private readonly unwatch: () => void;

  constructor(
    private readonly sheet: Sheet,
    private readonly ports: AutosavePorts,
  ) {
    this.unwatch = sheet.subscribe(() => this.onSheet());
    this.onSheet();
  }

  readonly getStatus = (): SaveStatus => this.status;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** Tries at once instead of waiting for the next turn: the line is back, or the page is about to go. */
  wake(): void {
    if (this.sending || this.stopped) return;
    this.cancelTimer?.();
    this.cancelTimer = null;
    void this.send();
  }

  stop(): void {
    this.stopped = true;
    this.cancelTimer?.();
    this.unwatch();
  }

  private onSheet(): void {
    const { items, sync } = this.sheet.getState();
    if (items === this.seen.items && sync === this.seen.sync) return;
    const edited = items !== this.seen.items;
    this.seen = { items, sync };
    const edits = waiting(sync, items);
    this.ports.keep(edits.length > 0 || sync.inFlight ? { inFlight: sync.inFlight, edits } : null);
    // A new edit is a new try: what was refused may have been put right by it.
    if (edited && this.trouble?.state === 'refused') this.trouble = null;
    if (!this.trouble && !this.sending && this.hasWork()) this.plan(DEBOUNCE_MS);
    this.report();
  }

  private hasWork(): boolean {
    const { items, sync } = this.sheet.getState();
    return sync.inFlight !== null || differences(sync, items).length > 0;
  }

  private plan(afterMs: number): void {
    if (this.cancelTimer || this.stopped) return;
    this.cancelTimer = this.ports.timer(() => {
      this.cancelTimer = null;
      void this.send();
    }, afterMs);
  }

  private async send(): Promise<void> {
    if (this.sending || this.stopped) return;
    // Set before the batch departs: the sheet tells its watchers at once, this one included.
    this.sending = true;
    const batch = this.sheet.getState().sync.inFlight ?? this.sheet.depart(this.ports.newId());
    if (!batch) {
      this.sending = false;
      return this.report();
    }
    this.report();
    const answer = await this.ports.send(batch);
    this.sending = false;
    // The sheet was left meanwhile; what was kept is settled when it is opened again.
    if (this.stopped) return;
    this.take(answer);
    if (this.hasWork() && this.trouble?.state !== 'refused') this.plan(this.trouble ? this.nextRetry() : 0);
    this.report();
  }

  private take(answer: SendAnswer): void {
    this.trouble = null;
    if (answer.kind === 'unreachable') {
      this.trouble = { state: 'offline', detail: answer.message };
      return;
    }
    this.retryMs = FIRST_RETRY_MS;
    if (answer.kind === 'accepted') this.sheet.acknowledge(answer.result);
    else if (answer.kind === 'refused') this.refuse(answer.message);
    else if (!this.sheet.meetStale(answer.conflicts))
      this.refuse('The server holds another state. Load the sheet again.');
  }

  private refuse(detail: string): void {
    this.trouble = { state: 'refused', detail };
    if (this.sheet.getState().sync.inFlight) this.sheet.drop();
  }

  private nextRetry(): number {
    const now = this.retryMs;
    this.retryMs = Math.min(LONGEST_RETRY_MS, now * 2);
    return now;
  }

  private report(): void {
    const next = this.statusNow();
    if (next.state === this.status.state && next.detail === this.status.detail) return;
    this.status = next;
    for (const listener of [...this.listeners]) listener();
  }

  private statusNow(): SaveStatus {
    const { conflicts } = this.sheet.getState().sync;
    if (conflicts.length > 0) {
      const what = conflicts.length === 1 ? 'An item was' : `${conflicts.length} items were`;
      return { state: 'conflict', detail: `${what} changed by somebody else as well. Choose which one stays.` };
    }
    if (this.trouble) return this.trouble;
    return { state: this.sending || this.hasWork() ? 'saving' : 'saved', detail: null };
  }
}
