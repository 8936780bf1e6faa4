import { randomUUID } from 'node:crypto';

/** A name that no other test of this run uses: all of them share one database. */
export function unique(word: string): string {
  return `${word} ${randomUUID().slice(0, 8)}`;
}

export function uniqueEmail(): string {
  return `person-${randomUUID().slice(0, 8)}@example.com`;
}
