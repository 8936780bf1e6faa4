import type { DexterityMap } from '@/lib/contracts/maps';
import type { MapTile } from '@/lib/kinematics/types';
import type { Timer } from '@/lib/editor/autosave';
import type { MapQuestion } from '@/lib/layout/map-question-schema';

export type MapEntryState = 'asking' | DexterityMap['state'] | 'fetching' | 'ready' | 'unreachable';

/** One map question of this sheet and how far its answer has come. */
export interface MapEntry {
  readonly key: string;
  readonly question: MapQuestion;
  readonly state: MapEntryState;
  readonly map: DexterityMap | null;
  /** All rows of the map once it is `ready`. */
  readonly tile: MapTile | null;
  /** Why there is no map, in words. */
  readonly trouble: string | null;
}

export interface MapBookPorts {
  readonly ask: (question: MapQuestion) => Promise<DexterityMap>;
  readonly look: (mapId: string) => Promise<DexterityMap>;
  readonly fetchTile: (map: DexterityMap) => Promise<MapTile>;
  readonly cancel: (mapId: string) => Promise<DexterityMap>;
  readonly retry: (mapId: string) => Promise<DexterityMap>;
  /** Whether asking again later makes sense, and what to say. */
  readonly judge: (error: unknown) => { passing: boolean; words: string };
  readonly timer: Timer;
}

const FIRST_LOOK_MS = 300;
const LONGEST_LOOK_MS = 4000;
const RETRY_MS = 5000;
/** Answers kept though no robot of the sheet asks for them now, so that going back to an earlier height shows at once. */
const KEPT_UNWANTED = 24;

/** Equal questions are equal to the last digit, so their text is their name. */
export const keyOf = (question: MapQuestion): string => JSON.stringify(question);

/**
 * The maps that a sheet asked for, each question once however many robots ask it. A base that moves asks the same question
 * as before, so nothing goes out.
 */
export class MapBook {
  private entries = new Map<string, MapEntry>();
  private wanted = new Set<string>();
  private readonly timers = new Map<string, () => void>();
  private readonly listeners = new Set<() => void>();

  constructor(private readonly ports: MapBookPorts) {}

  readonly getEntries = (): ReadonlyMap<string, MapEntry> => this.entries;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** What the sheet shows now. New questions are asked; those no longer wanted are no longer followed. */
  want(questions: readonly MapQuestion[]): void {
    this.wanted = new Set(questions.map(keyOf));
    for (const question of questions) {
      const entry = this.entries.get(keyOf(question));
      if (!entry) void this.ask(question);
      else if (isUnderWay(entry.state) && !this.timers.has(entry.key)) this.lookLater(entry, FIRST_LOOK_MS);
      else if (entry.state === 'unreachable') void this.ask(question);
    }
    for (const [key, cancel] of this.timers) {
      if (this.wanted.has(key)) continue;
      cancel();
      this.timers.delete(key);
    }
    this.forgetOldest();
  }

  async cancel(key: string): Promise<void> {
    await this.command(key, this.ports.cancel);
  }

  async retry(key: string): Promise<void> {
    const entry = this.entries.get(key);
    if (entry && !entry.map) await this.ask(entry.question);
    else await this.command(key, this.ports.retry);
  }

  /** Follows nothing more until something is wanted again. */
  stop(): void {
    this.wanted = new Set();
    for (const cancel of this.timers.values()) cancel();
    this.timers.clear();
  }

  private async command(key: string, act: (mapId: string) => Promise<DexterityMap>): Promise<void> {
    const entry = this.entries.get(key);
    if (!entry?.map) return;
    try {
      await this.take(entry, await act(entry.map.id), FIRST_LOOK_MS);
    } catch (error) {
      this.set({ ...entry, trouble: this.ports.judge(error).words });
    }
  }

  private async ask(question: MapQuestion): Promise<void> {
    const key = keyOf(question);
    const entry: MapEntry = { key, question, state: 'asking', map: null, tile: null, trouble: null };
    this.set(entry);
    try {
      await this.take(entry, await this.ports.ask(question), FIRST_LOOK_MS);
    } catch (error) {
      const { passing, words } = this.ports.judge(error);
      this.set({ ...entry, state: passing ? 'unreachable' : 'failed', trouble: words });
      if (passing) this.later(key, RETRY_MS, () => this.ask(question));
    }
  }

  /** A word of the server about a map: fetch it, look again after a while, or leave it. */
  private async take(entry: MapEntry, map: DexterityMap, nextLookMs: number): Promise<void> {
    const next: MapEntry = { ...entry, state: map.state, map, trouble: map.failure };
    if (map.state === 'done') return this.fetch(next, map);
    this.set(next);
    if (isUnderWay(map.state)) this.lookLater(next, nextLookMs);
  }

  private async fetch(entry: MapEntry, map: DexterityMap): Promise<void> {
    this.set({ ...entry, state: 'fetching' });
    try {
      const tile = await this.ports.fetchTile(map);
      this.set({ ...entry, state: 'ready', tile, trouble: null });
    } catch (error) {
      const { passing, words } = this.ports.judge(error);
      this.set({ ...entry, state: passing ? 'unreachable' : 'failed', trouble: words });
      if (passing) this.later(entry.key, RETRY_MS, () => this.fetch(entry, map));
    }
  }

  private lookLater(entry: MapEntry, afterMs: number): void {
    const { map } = entry;
    if (!map) return;
    this.later(entry.key, afterMs, async () => {
      const slower = Math.min(LONGEST_LOOK_MS, afterMs * 1.5);
      try {
        await this.take(entry, await this.ports.look(map.id), slower);
      } catch (error) {
        const { passing, words } = this.ports.judge(error);
        if (passing) this.lookLater(entry, LONGEST_LOOK_MS);
        else this.set({ ...entry, state: 'failed', trouble: words });
      }
    });
  }

  private later(key: string, afterMs: number, action: () => Promise<void>): void {
    this.timers.get(key)?.();
    this.timers.delete(key);
    if (!this.wanted.has(key)) return;
    const cancel = this.ports.timer(() => {
      this.timers.delete(key);
      void action();
    }, afterMs);
    this.timers.set(key, cancel);
  }

  private set(entry: MapEntry): void {
    const entries = new Map(this.entries);
    // The newest stand last, so that the oldest are the first to be forgotten.
    entries.delete(entry.key);
    entries.set(entry.key, entry);
    this.entries = entries;
    for (const listener of [...this.listeners]) listener();
  }

  private forgetOldest(): void {
    const unwanted = [...this.entries.keys()].filter((key) => !this.wanted.has(key));
    const tooMany = unwanted.slice(0, Math.max(0, unwanted.length - KEPT_UNWANTED));
    if (tooMany.length === 0) return;
    const entries = new Map(this.entries);
    for (const key of tooMany) entries.delete(key);
    this.entries = entries;
  }
}

function isUnderWay(state: MapEntryState): boolean {
  return state === 'queued' || state === 'running';
}
