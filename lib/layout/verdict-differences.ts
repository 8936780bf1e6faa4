import { matchTaskPoints, type ItemDifference, type MatchedItems } from './differences';
import type { PointVerdict } from './verdicts';
import { VERDICT_BANDS, type VerdictBand } from './verdict-words';

/** What a difference does to the work. */
export interface Effect {
  readonly words: string;
  readonly direction: 'better' | 'worse' | 'none';
}

export interface PointChange extends Effect {
  readonly fixtureLeftId: string;
  /** The robots that serve the point best before and after; null where none is there. */
  readonly robotLeftId: string | null;
  readonly robotRightId: string | null;
}

const NO_EFFECT: Effect = { words: 'none', direction: 'none' };

/** What became of every task point that both sheets have and whose verdict differs. */
export function pointChanges(
  matched: MatchedItems,
  left: readonly PointVerdict[],
  right: readonly PointVerdict[],
): PointChange[] {
  const before = new Map(left.map((verdict) => [verdict.pointId, verdict]));
  const after = new Map(right.map((verdict) => [verdict.pointId, verdict]));
  return matched.pairs.flatMap(({ left: leftItem, right: rightItem }) => {
    if (leftItem.kind !== 'fixture' || rightItem.kind !== 'fixture') return [];
    return matchTaskPoints(leftItem, rightItem).flatMap((pair) => {
      const from = before.get(pair.left.id)?.best ?? null;
      const to = after.get(pair.right.id)?.best ?? null;
      const effect = bandEffect(pair.right.name, from?.band ?? 'out', to?.band ?? 'out');
      if (!effect) return [];
      return [
        {
          ...effect,
          fixtureLeftId: leftItem.id,
          robotLeftId: from?.robotId ?? null,
          robotRightId: to?.robotId ?? null,
        },
      ];
    });
  });
}

function bandEffect(name: string, from: VerdictBand, to: VerdictBand): Effect | null {
  if (from === to) return null;
  const direction = VERDICT_BANDS.indexOf(to) < VERDICT_BANDS.indexOf(from) ? 'better' : 'worse';
  if (from === 'out') return { words: `${name} now reached`, direction };
  if (to === 'out') return { words: `${name} out of reach`, direction };
  return { words: `${name} ${from} → ${to}`, direction };
}

/**
 * What a difference may have done: the changed points of a moved fixture, or those that a moved robot serves or served.
 * Where several things moved, one change can stand beside each of them.
 */
export function effectsOf(difference: ItemDifference, changes: readonly PointChange[]): readonly Effect[] {
  const mine = changes.filter((change) => {
    if (difference.kind === 'fixture') return change.fixtureLeftId === difference.leftId;
    if (difference.kind !== 'robot') return false;
    const served = difference.leftId !== null && change.robotLeftId === difference.leftId;
    return served || change.robotRightId === difference.itemId;
  });
  return mine.length > 0 ? mine : [NO_EFFECT];
}
