'use client';

/** A reader's own choice, kept in this browser and told to every window of it. A browser that keeps nothing holds it for the page. */
export interface KeptChoice<Value> {
  readonly read: () => Value;
  readonly choose: (value: Value) => void;
  readonly subscribe: (listener: () => void) => () => void;
}

/** `parse` answers the choice for what is stored; null is what was never stored, and anything may stand there. */
export function keptChoice<Value>(key: string, parse: (text: string | null) => Value): KeptChoice<Value> {
  const listeners = new Set<() => void>();
  let current: { value: Value } | null = null;
  const stored = (): string | null => {
    try {
      return localStorage.getItem(key);
    } catch {
      return null;
    }
  };
  const onStorage = (event: StorageEvent) => {
    if (event.key !== key && event.key !== null) return;
    current = null;
    for (const listener of [...listeners]) listener();
  };
  return {
    read: () => (current ??= { value: parse(stored()) }).value,
    choose: (value) => {
      current = { value };
      try {
        localStorage.setItem(key, typeof value === 'string' ? value : JSON.stringify(value));
      } catch {
        // Holds for this page at least.
      }
      for (const listener of [...listeners]) listener();
    },
    subscribe: (listener) => {
      if (listeners.size === 0) window.addEventListener('storage', onStorage);
      listeners.add(listener);
      return () => {
        listeners.delete(listener);
        if (listeners.size === 0) window.removeEventListener('storage', onStorage);
      };
    },
  };
}
