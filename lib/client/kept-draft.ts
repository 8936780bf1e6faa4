/**
 * Where an unsaved form outlives a reload or the way back: sessionStorage, so it is gone with the window. One entry a person and
 * subject. A full or forbidden storage keeps nothing; saving works all the same.
 */
const PREFIX = 'elbowroom.draft';

export interface KeptDraft {
  read(): string | null;
  write(text: string | null): void;
}

export function keptDraft(userId: string, subject: string): KeptDraft {
  const entry = `${PREFIX}.${userId}.${subject}`;
  return {
    read() {
      try {
        return sessionStorage.getItem(entry);
      } catch {
        return null;
      }
    },
    write(text) {
      try {
        if (text === null) sessionStorage.removeItem(entry);
        else sessionStorage.setItem(entry, text);
      } catch {
        // Nothing to be done about it, and nothing is lost by it yet.
      }
    },
  };
}
