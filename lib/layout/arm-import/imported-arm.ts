import type { Arm } from '@/lib/kinematics/types';

/** Larger files are refused unread. */
export const IMPORT_MAX_BYTES = 1024 * 1024;

/** An arm as a file tells it. What the file does not say is NaN: it is asked for, never filled in silently. */
export interface ImportedArm {
  readonly name: string;
  readonly description: string;
  readonly payloadKg: number | null;
  readonly arm: Arm;
  /** Where each joint stands in the file: "line 4", "joint shoulder". */
  readonly sources: readonly string[];
  /** What was taken for granted or left out, as sentences. */
  readonly notes: readonly string[];
}

/** Why a file is not taken, and where. */
export interface Refusal {
  /** "Line 4, column from"; null where it concerns the whole file. */
  readonly where: string | null;
  readonly message: string;
}

export type Imported<Value> =
  { readonly ok: true; readonly value: Value } | { readonly ok: false; readonly refusals: readonly Refusal[] };

/** Thrown inside the readers and caught at their edge. */
export class Refused extends Error {
  constructor(readonly refusals: readonly Refusal[]) {
    super(refusals.map(({ message }) => message).join(' '));
  }
}

export const refuse = (message: string, where: string | null = null): never => {
  throw new Refused([{ where, message }]);
};

/** Turns what a reader throws as Refused into an answer. */
export function answering<Value>(read: () => Value): Imported<Value> {
  try {
    return { ok: true, value: read() };
  } catch (error) {
    if (error instanceof Refused) return { ok: false, refusals: error.refusals };
    throw error;
  }
}

/** Throws Refused above the limit. */
export function demandSize(text: string): void {
  if (text.length > IMPORT_MAX_BYTES || new TextEncoder().encode(text).length > IMPORT_MAX_BYTES)
    refuse('The file is larger than 1 MB. A description of one arm takes a few kilobytes.');
}
