/**
 * Where edits that wait to be saved outlive a reload: localStorage, one entry a window, because two windows on one sheet must
 * not write over each other. It is written at once, so that not even a crash between an edit and its saving loses it.
 */

const PREFIX = 'elbowroom.edits';
const WINDOW_KEY = 'elbowroom.window';

export interface KeptStore {
  /** What this window left, and what windows left that are closed by now. */
  read(): Promise<string[]>;
  write(text: string | null): void;
  /** Entries taken over by this window; called once their edits are on the sheet and kept under its own name. */
  dropTakenOver(): void;
}

/** A name that stays with a browser window over a reload. */
function windowName(): string {
  const known = sessionStorage.getItem(WINDOW_KEY);
  if (known) return known;
  const name = crypto.randomUUID();
  sessionStorage.setItem(WINDOW_KEY, name);
  return name;
}

/** Holds a lock for as long as the window is open, so that others can tell its entry is in use. */
function claim(entry: string): Promise<boolean> {
  if (!navigator.locks) return Promise.resolve(true);
  return new Promise((resolve) => {
    void navigator.locks.request(entry, { ifAvailable: true }, (lock) => {
      resolve(lock !== null);
      return lock ? new Promise<void>(() => {}) : undefined;
    });
  });
}

/** Entries of one sheet and one person: another person who signs in on this browser must not send them. */
export function keptStore(layoutId: string, userId: string): KeptStore {
  const prefix = `${PREFIX}.${userId}.${layoutId}.`;
  let own = prefix + windowName();
  let takenOver: string[] = [];
  return {
    async read() {
      // A duplicated window copies the name of the first one; it gets one of its own.
      if (!(await claim(own)) && !claimedHere.has(own)) own = prefix + crypto.randomUUID();
      claimedHere.add(own);
      const texts: string[] = [];
      takenOver = [];
      for (const entry of entriesOf(prefix)) {
        const isFree = entry === own || claimedHere.has(entry) || (navigator.locks && (await claim(entry)));
        if (isFree) claimedHere.add(entry);
        const text = isFree ? localStorage.getItem(entry) : null;
        if (!text) continue;
        texts.push(text);
        if (entry !== own) takenOver.push(entry);
      }
      return texts;
    },
    write(text) {
      try {
        if (text === null) localStorage.removeItem(own);
        else localStorage.setItem(own, text);
      } catch {
        // A full or forbidden store: the sheet still saves to the server, only a reload while offline would lose edits.
      }
    },
    dropTakenOver() {
      for (const entry of takenOver) localStorage.removeItem(entry);
      takenOver = [];
    },
  };
}

/** Locks are held by the page, not by one mount of the sheet on it. */
const claimedHere = new Set<string>();

function entriesOf(prefix: string): string[] {
  return Array.from({ length: localStorage.length }, (_, index) => localStorage.key(index) ?? '').filter((entry) =>
    entry.startsWith(prefix),
  );
}
