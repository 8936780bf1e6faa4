import { newKey, type ArmDraft } from './draft';

/** A draft as text, for keeping it over a reload. JSON has no NaN: it comes back for what is null. */
export function writeKeptDraft(draft: ArmDraft): string {
  return JSON.stringify({ format: FORMAT, draft });
}

const FORMAT = 1;

/** Null for a text that is none of ours. Rows get keys of this page. */
export function readKeptDraft(text: string | null): ArmDraft | null {
  if (!text) return null;
  try {
    const revive = (key: string, value: unknown): unknown => (key === 'value' && value === null ? NaN : value);
    const { format, draft } = JSON.parse(text, revive) as { format: number; draft: ArmDraft };
    if (format !== FORMAT) return null;
    return { ...draft, joints: draft.joints.map((joint) => ({ ...joint, key: newKey() })) };
  } catch {
    return null;
  }
}
