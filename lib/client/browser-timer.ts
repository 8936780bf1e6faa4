import type { Timer } from '@/lib/editor/autosave';

export const browserTimer: Timer = (action, afterMs) => {
  const id = setTimeout(action, afterMs);
  return () => clearTimeout(id);
};
