import type { MapSettings } from '@/lib/layout/map-settings';
import type { SaveStatus, Timer } from './autosave';
import { same } from './same';

export interface SettingsPorts {
  /** Saves the settings. Answers what is wrong, and whether trying again may help; null when they are in. */
  readonly save: (settings: MapSettings) => Promise<{ passing: boolean; message: string } | null>;
  readonly timer: Timer;
}

const DEBOUNCE_MS = 400;
const RETRY_MS = 4000;

/**
 * The map settings of a sheet: one value for the whole team, where the last one to choose wins. A choice shows at once and
 * is saved by itself; until it is in, what others choose does not replace it.
 */
export class SettingsKeeper {
  private status: SaveStatus = { state: 'saved', detail: null };
  private stored: MapSettings;
  private readonly listeners = new Set<() => void>();
  private cancelTimer: (() => void) | null = null;
  private sending = false;
  private stopped = false;

  constructor(
    private settings: MapSettings,
    private readonly ports: SettingsPorts,
  ) {
    this.stored = settings;
  }

  readonly getSettings = (): MapSettings => this.settings;
  readonly getStatus = (): SaveStatus => this.status;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  change(patch: Partial<MapSettings>): void {
    const next = { ...this.settings, ...patch };
    if (same(next, this.settings)) return;
    this.settings = next;
    this.status = { state: 'saving', detail: null };
    this.plan(DEBOUNCE_MS);
    this.tell();
  }

  /** The settings as the server holds them. */
  merge(theirs: MapSettings): void {
    if (this.status.state !== 'saved' || same(theirs, this.stored)) return;
    this.settings = theirs;
    this.stored = theirs;
    this.tell();
  }

  stop(): void {
    this.stopped = true;
    this.cancelTimer?.();
  }

  private plan(afterMs: number): void {
    this.cancelTimer?.();
    if (this.stopped) return;
    this.cancelTimer = this.ports.timer(() => {
      this.cancelTimer = null;
      void this.save();
    }, afterMs);
  }

  private async save(): Promise<void> {
    if (this.sending) return;
    const sent = this.settings;
    this.sending = true;
    const trouble = await this.ports.save(sent);
    this.sending = false;
    if (trouble) {
      this.status = { state: trouble.passing ? 'offline' : 'refused', detail: trouble.message };
      // Refused settings would only be refused again; the sheet goes back to those that hold.
      if (!trouble.passing) this.settings = this.stored;
      if (trouble.passing) this.plan(RETRY_MS);
    } else {
      this.stored = sent;
      const isNewest = same(sent, this.settings);
      this.status = { state: isNewest ? 'saved' : 'saving', detail: null };
      if (!isNewest) this.plan(0);
    }
    this.tell();
  }

  private tell(): void {
    for (const listener of [...this.listeners]) listener();
  }
}

/** The state of the sheet as one word: the worst of its parts. */
export function worstOf(...statuses: readonly SaveStatus[]): SaveStatus {
  const order: SaveStatus['state'][] = ['conflict', 'refused', 'offline', 'saving', 'saved'];
  const [worst] = [...statuses].sort((one, other) => order.indexOf(one.state) - order.indexOf(other.state));
  return worst;
}
