'use client';

import {
  AlignCenterHorizontal,
  AlignCenterVertical,
  AlignEndHorizontal,
  AlignEndVertical,
  AlignHorizontalDistributeCenter,
  AlignStartHorizontal,
  AlignStartVertical,
  AlignVerticalDistributeCenter,
  type LucideIcon,
} from 'lucide-react';
import { Button } from '@/components/ui/button';
import { Tooltip } from '@/components/ui/tooltip';
import type { Alignment, Direction } from '@/lib/editor/arrange';
import { units } from '@/lib/editor/groups';
import { NOTHING } from '@/lib/editor/tools/tool';
import type { Item } from '@/lib/layout/items';
import { useBoard } from './board-context';
import { useClipboard } from './use-clipboard';
import { useSelectionCommands } from './use-selection-commands';

const ALIGNMENTS: readonly { readonly to: Alignment; readonly words: string; readonly Icon: LucideIcon }[] = [
  { to: 'left', words: 'Line up left edges', Icon: AlignStartVertical },
  { to: 'centre', words: 'Line up middles, side by side', Icon: AlignCenterVertical },
  { to: 'right', words: 'Line up right edges', Icon: AlignEndVertical },
  { to: 'far', words: 'Line up upper edges', Icon: AlignStartHorizontal },
  { to: 'middle', words: 'Line up middles, one above another', Icon: AlignCenterHorizontal },
  { to: 'near', words: 'Line up lower edges', Icon: AlignEndHorizontal },
];

const DIRECTIONS: readonly { readonly to: Direction; readonly words: string; readonly Icon: LucideIcon }[] = [
  { to: 'across', words: 'Equal gaps from left to right', Icon: AlignHorizontalDistributeCenter },
  { to: 'away', words: 'Equal gaps from bottom to top', Icon: AlignVerticalDistributeCenter },
];

/** Several things are chosen: what can be done with them together. */
export function SelectionPanel({ items }: { readonly items: readonly Item[] }) {
  const { sheet } = useBoard();
  const commands = useSelectionCommands();
  const clipboard = useClipboard();
  const isLocked = items.every(({ locked }) => locked);
  const isHidden = items.every(({ hidden }) => hidden);
  const parts = units(items);
  const isOneGroup = parts.length === 1;
  const hasGroup = items.some(({ groupId }) => groupId !== undefined);
  return (
    <>
      <div className="flex items-center justify-between gap-2">
        <p className="font-semibold">
          {items.length} items chosen{isOneGroup && ', one group'}
        </p>
        <Button variant="quiet" size="small" onClick={() => sheet.select(NOTHING)}>
          Let go
        </Button>
      </div>
      <div role="group" aria-label="Line up" className="mt-1 -ml-2 flex flex-wrap">
        {ALIGNMENTS.map(({ to, words, Icon }) => (
          <Small key={to} words={words} disabled={parts.length < 2 || isLocked} onClick={() => commands.align(to)}>
            <Icon aria-hidden className="size-4" />
          </Small>
        ))}
        {DIRECTIONS.map(({ to, words, Icon }) => (
          <Small key={to} words={words} disabled={parts.length < 3 || isLocked} onClick={() => commands.distribute(to)}>
            <Icon aria-hidden className="size-4" />
          </Small>
        ))}
      </div>
      <div role="group" aria-label="All of them" className="mt-1 flex flex-wrap gap-1.5">
        <Button size="small" disabled={isLocked} onClick={commands.pickUp}>
          Pick up
        </Button>
        <Button size="small" disabled={isOneGroup} onClick={commands.group}>
          Group
        </Button>
        <Button size="small" disabled={!hasGroup} onClick={commands.ungroup}>
          Ungroup
        </Button>
        <Button size="small" onClick={() => commands.toggle('locked')}>
          {isLocked ? 'Unlock' : 'Lock'}
        </Button>
        <Button size="small" onClick={() => commands.toggle('hidden')}>
          {isHidden ? 'Show' : 'Hide'}
        </Button>
        <Button size="small" onClick={clipboard.copy}>
          Copy
        </Button>
        <Button size="small" onClick={commands.duplicate}>
          Duplicate
        </Button>
        <Button size="small" disabled={isLocked} onClick={commands.remove}>
          Delete
        </Button>
      </div>
    </>
  );
}

interface SmallProps {
  readonly words: string;
  readonly disabled: boolean;
  readonly onClick: () => void;
  readonly children: React.ReactNode;
}

function Small({ words, disabled, onClick, children }: SmallProps) {
  return (
    <Tooltip content={words}>
      <Button
        variant="quiet"
        size="icon"
        aria-label={words}
        // Kept in reach, so that the keyboard does not lose its place when a choice shrinks.
        aria-disabled={disabled}
        onClick={disabled ? undefined : onClick}
        className="size-8 aria-disabled:opacity-45 pointer-coarse:size-11"
      >
        {children}
      </Button>
    </Tooltip>
  );
}
