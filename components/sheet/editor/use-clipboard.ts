'use client';

import { useEffect, useMemo } from 'react';
import { copiedText, pasted, readCopied } from '@/lib/editor/clipboard';
import { onTheirOwn, removed } from '@/lib/editor/edits';
import { named } from '@/lib/editor/tools/move';
import { chosen } from '@/lib/editor/tools/tool';
import type { Item } from '@/lib/layout/items';
import { useBoard } from './board-context';

/** A paste onto the sheet that it was copied from stands this far beside, mm. */
const BESIDE_MM = 250;
/** For the commands in menus: a page may not read the system's clipboard unasked. Shared by all windows of one reader. */
const KEPT = 'elbowroom-copied';

/** Copying, cutting and pasting items, by the browser's own events or by commands. */
export function useClipboard() {
  const { sheet, layout, arms } = useBoard();
  return useMemo(() => {
    const selected = (): Item[] => {
      const { items, selection } = sheet.getState();
      return selection.itemIds.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);
    };
    /** The text that was copied; null with nothing chosen. */
    const take = (): string | null => {
      const items = selected();
      if (items.length === 0) return null;
      const text = copiedText(onTheirOwn(items, sheet.getState().items), layout.id);
      try {
        localStorage.setItem(KEPT, text);
      } catch {
        // The system's clipboard still has it.
      }
      sheet.say(`Copied ${named(items)}`);
      return text;
    };
    const drop = () => {
      const { items, selection } = sheet.getState();
      const changes = removed(items, selection.itemIds);
      if (changes.length === 0) return sheet.refuse('It is locked. Unlock it to cut it.');
      sheet.commit(`Cut ${named(selected())}`, changes);
    };
    /** Answers false for a text that is none of ours. */
    const put = (text: string): boolean => {
      const copied = readCopied(text);
      if (copied.kind === 'foreign') return false;
      if (copied.kind === 'refused') {
        sheet.refuse(copied.message);
        return true;
      }
      const { items } = sheet.getState();
      const result = pasted(copied.items, {
        items,
        byMm: copied.layoutId === layout.id ? BESIDE_MM : 0,
        knowsArm: (armId) => arms.has(armId),
        newId: () => crypto.randomUUID(),
      });
      if (!result.ok) sheet.refuse(result.message);
      else sheet.commit(`Paste ${named(copied.items)}`, result.changes, chosen(...result.itemIds));
      return true;
    };
    const copy = () => {
      const text = take();
      // Where the system's clipboard is closed to the page, the kept copy serves.
      if (text) void navigator.clipboard?.writeText(text).catch(() => undefined);
    };
    return {
      take,
      drop,
      put,
      copy,
      cut() {
        copy();
        drop();
      },
      async paste() {
        const text = await navigator.clipboard?.readText().catch(() => null);
        if (text && put(text)) return;
        const kept = localStorage.getItem(KEPT);
        if (!kept || !put(kept)) sheet.refuse('Nothing was copied yet.');
      },
    };
  }, [sheet, layout.id, arms]);
}

/** The browser's copy, cut and paste, wherever the keyboard is on the page but in a field or a dialog. */
export function useClipboardEvents(): void {
  const { take, drop, put } = useClipboard();
  useEffect(() => {
    const isElsewhere = (event: ClipboardEvent): boolean => {
      const target = event.target;
      const isField =
        target instanceof HTMLElement && target.closest('input, textarea, [contenteditable], [role="dialog"]');
      // Letters that somebody marked on the page are copied as letters.
      return Boolean(isField) || (event.type !== 'paste' && Boolean(window.getSelection()?.toString()));
    };
    const onCopy = (event: ClipboardEvent) => {
      if (isElsewhere(event)) return;
      const text = take();
      if (text === null) return;
      event.preventDefault();
      event.clipboardData?.setData('text/plain', text);
      if (event.type === 'cut') drop();
    };
    const onPaste = (event: ClipboardEvent) => {
      const text = event.clipboardData?.getData('text/plain');
      if (!text || isElsewhere(event) || !put(text)) return;
      event.preventDefault();
    };
    document.addEventListener('copy', onCopy);
    document.addEventListener('cut', onCopy);
    document.addEventListener('paste', onPaste);
    return () => {
      document.removeEventListener('copy', onCopy);
      document.removeEventListener('cut', onCopy);
      document.removeEventListener('paste', onPaste);
    };
  }, [take, drop, put]);
}
