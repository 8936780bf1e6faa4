'use client';

import { useCallback, useSyncExternalStore } from 'react';
import { guestSchema, type Guest } from '@/lib/contracts/remarks';

const KEY = 'elbowroom.guest';
const listeners = new Set<() => void>();

/** Storage can be forbidden (private windows); a guest then gives the name again. */
function readText(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    return null;
  }
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  window.addEventListener('storage', listener);
  return () => {
    listeners.delete(listener);
    window.removeEventListener('storage', listener);
  };
}

function parse(text: string | null): Guest | null {
  try {
    const parsed = guestSchema.safeParse(JSON.parse(text ?? 'null'));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** Who the guest on this browser said they are, kept for the next remark. */
export function useGuest(): { readonly guest: Guest | null; readonly keepGuest: (guest: Guest | null) => void } {
  const text = useSyncExternalStore(subscribe, readText, () => null);
  const keepGuest = useCallback((guest: Guest | null) => {
    try {
      if (guest) localStorage.setItem(KEY, JSON.stringify(guest));
      else localStorage.removeItem(KEY);
    } catch {
      return;
    }
    for (const listener of listeners) listener();
  }, []);
  return { guest: parse(text), keepGuest };
}
