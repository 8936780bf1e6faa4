'use client';

import { createContext, useContext, type ReactNode } from 'react';
import type { Account } from '@/lib/contracts/accounts';
import type { Role } from '@/lib/contracts/common';

const AccountContext = createContext<Account | null>(null);

/** Tells the pages below who is signed in. The server decides what they may do; this only spares them useless buttons. */
export function AccountProvider({ account, children }: { account: Account; children: ReactNode }) {
  return <AccountContext value={account}>{children}</AccountContext>;
}

/** Who is signed in. Throws outside the signed-in pages. */
export function useAccount(): Account {
  const account = useContext(AccountContext);
  if (!account) throw new Error('useAccount is for signed-in pages only.');
  return account;
}

const ORDER: readonly Role[] = ['viewer', 'planner', 'integrator', 'admin'];

/** True when the signed-in person has at least that role. */
export function useMayActAs(least: Role): boolean {
  return ORDER.indexOf(useAccount().role) >= ORDER.indexOf(least);
}
