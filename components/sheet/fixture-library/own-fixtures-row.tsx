'use client';

import { useState } from 'react';
import { useBoard } from '@/components/sheet/editor/board-context';
import { useLastInput } from '@/components/sheet/editor/use-last-input';
import { Menu, MenuHeading, MenuItem } from '@/components/ui/menu';
import { useLibraryFixtures } from '@/lib/client/use-library-fixtures';
import type { LibraryFixture } from '@/lib/contracts/library-fixtures';
import { placeSavedInView } from '@/lib/editor/place-in-view';
import { savedFixtureTool } from '@/lib/editor/tools/place';
import { ManageFixturesDialog } from './manage-fixtures-dialog';
import { savedWords } from './saved-words';

/** The organisation's own fixtures: a menu to take one in hand, by keyboard to place it at once, and to manage them. */
export function OwnFixturesRow({ className }: { readonly className: string }) {
  const { sheet, view } = useBoard();
  const { data, error, mutate } = useLibraryFixtures();
  const lastInput = useLastInput();
  const [isManaged, setManaged] = useState(false);
  const fixtures = data?.fixtures ?? [];
  const place = (saved: LibraryFixture) => {
    if (lastInput() !== 'keyboard') return sheet.use(savedFixtureTool(saved));
    const { items, snapping } = sheet.getState();
    const placed = placeSavedInView(items, saved, {
      middle: view.middle(),
      snapping,
      newId: () => crypto.randomUUID(),
    });
    sheet.commit(placed.label, placed.changes, placed.selection);
  };
  const words = error ? 'could not be opened' : data ? `${fixtures.length} in the library` : 'opening the library';
  return (
    <>
      <Menu
        align="start"
        trigger={
          <button type="button" data-tool="ownFixture" className={className}>
            <svg
              viewBox="0 0 22 22"
              width="22"
              height="22"
              fill="none"
              stroke="currentColor"
              strokeWidth="1.4"
              aria-hidden
            >
              <path d="M2.5 8.5h13v9h-13zM2.5 8.5l13 9M15.5 8.5l-13 9M6 8V4.5h13.5v9H16" />
            </svg>
            <span>
              Own fixture
              <span className="block text-[0.8125rem] leading-4 text-ink-soft">{words}</span>
            </span>
          </button>
        }
      >
        <MenuHeading>Which fixture?</MenuHeading>
        {fixtures.map((saved) => (
          <MenuItem key={saved.id} onSelect={() => place(saved)}>
            {saved.name}
            <span className="block text-[0.8125rem] leading-4 text-ink-soft">{savedWords(saved)}</span>
          </MenuItem>
        ))}
        {data && fixtures.length === 0 && (
          <MenuHeading>None yet. Choose a fixture and save it to the library.</MenuHeading>
        )}
        {error && <MenuItem onSelect={() => void mutate()}>{error.message} Try again</MenuItem>}
        {fixtures.length > 0 && <MenuItem onSelect={() => setManaged(true)}>Rename or delete…</MenuItem>}
      </Menu>
      {isManaged && <ManageFixturesDialog onClose={() => setManaged(false)} />}
    </>
  );
}
