import type { ReactNode } from 'react';
import { AccountMenu } from '@/components/shell/account-menu';
import { LeaveForSignIn } from '@/components/shell/leave-for-sign-in';
import { TitleBlockProvider } from '@/components/ui/title-block-context';
import { AccountProvider } from '@/lib/client/account-context';
import { getAccount } from '@/lib/server/accounts/data';
import { readMember } from '../read-member';

/** Guards the signed-in pages. The routes check again: this spares a stranger the empty shells, it is not the lock. */
export default async function SignedInLayout({ children }: { children: ReactNode }) {
  const member = await readMember();
  // A layout is not told the page's address, so the browser carries it to sign-in.
  if (!member) return <LeaveForSignIn />;
  return (
    <AccountProvider account={await getAccount(member)}>
      <TitleBlockProvider homeHref="/projects" account={<AccountMenu />}>
        {children}
      </TitleBlockProvider>
    </AccountProvider>
  );
}
