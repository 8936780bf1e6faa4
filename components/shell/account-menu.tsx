'use client';

import { LogOut } from 'lucide-react';
import { signOut } from 'next-auth/react';
import Link from 'next/link';
import { useState } from 'react';
import { chooseBoard, readBoardChoice, type BoardChoice } from '@/components/ui/board';
import { Button } from '@/components/ui/button';
import { Menu, MenuChoice, MenuHeading, MenuItem, MenuRule } from '@/components/ui/menu';
import { useAccount } from '@/lib/client/account-context';
import { chooseUnit, useUnits } from '@/lib/client/use-units';
import type { LengthUnit } from '@/lib/layout/length-units';
import { MailDialog } from './mail-dialog';
import { ROLE_NAMES } from './role-words';
import { sectionsFor } from './sections';

const BOARD_CHOICES: readonly { value: BoardChoice; label: string }[] = [
  { value: 'device', label: 'As the device' },
  { value: 'day', label: 'Day paper' },
  { value: 'night', label: 'Night board' },
];

const UNIT_CHOICES: readonly { value: LengthUnit; label: string }[] = [
  { value: 'mm', label: 'Millimetres' },
  { value: 'in', label: 'Inches' },
];

const initials = (name: string): string =>
  name
    .split(/\s+/)
    .filter(Boolean)
    .map((part) => part.charAt(0).toUpperCase())
    .filter((_, index, all) => index === 0 || index === all.length - 1)
    .join('');

/** Who is signed in, the ways to the other pages, the board, the units, and the way out. */
export function AccountMenu() {
  const account = useAccount();
  const { unit } = useUnits();
  const [choice, setChoice] = useState<BoardChoice>('device');
  const [choosesMails, setChoosesMails] = useState(false);
  return (
    <>
      <Menu
        trigger={
          <Button
            size="icon"
            aria-label={`Account of ${account.name}`}
            className="font-medium"
            // The choice lives in a cookie, which is read when it is wanted rather than while the page is drawn.
            onFocus={() => setChoice(readBoardChoice())}
          >
            {initials(account.name)}
          </Button>
        }
      >
        <MenuHeading>
          <span className="block text-[0.9375rem] font-semibold text-ink">{account.name}</span>
          <span className="block">{account.email}</span>
          <span className="block">
            {ROLE_NAMES[account.role]} at {account.organisation.name}
          </span>
        </MenuHeading>
        <MenuRule />
        {sectionsFor(account.role).map((section) => (
          <MenuItem key={section.href} asChild>
            <Link href={section.href}>{section.name}</Link>
          </MenuItem>
        ))}
        <MenuRule />
        <MenuItem asChild>
          <Link href="/tokens">API tokens</Link>
        </MenuItem>
        <MenuRule />
        <MenuChoice
          label="Board"
          value={choice}
          onValueChange={(next) => {
            chooseBoard(next);
            setChoice(next);
          }}
          options={BOARD_CHOICES}
        />
        <MenuRule />
        <MenuChoice label="Units" value={unit} onValueChange={chooseUnit} options={UNIT_CHOICES} />
        <MenuRule />
        <MenuItem onSelect={() => setChoosesMails(true)}>Mails…</MenuItem>
        <MenuItem
          icon={<LogOut aria-hidden className="size-4" />}
          onSelect={() => void signOut({ callbackUrl: '/sign-in' })}
        >
          Sign out
        </MenuItem>
      </Menu>
      {choosesMails && <MailDialog onClose={() => setChoosesMails(false)} />}
    </>
  );
}
