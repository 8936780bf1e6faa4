import './browser-gaps';
import { configure, render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactElement } from 'react';
import { SWRConfig } from 'swr';
import { Toaster } from '@/components/ui/toaster';
import { TooltipProvider } from '@/components/ui/tooltip';
import { AccountProvider } from '@/lib/client/account-context';
import type { Role } from '@/lib/contracts/common';
import { fakeId } from './fakes';

// A loaded machine is slow, which is no fault of the page: waiting longer costs nothing where things are as they should be.
configure({ asyncUtilTimeout: 20_000 });

/** Shows a piece of a signed-in page, with a cache of its own, and gives the person who uses it. */
export function show(element: ReactElement, role: Role = 'planner') {
  const account = {
    id: fakeId(900),
    name: 'Piet Marrow',
    email: 'planner@brackwater.example',
    role,
    organisation: { id: fakeId(901), name: 'Brackwater Integration' },
  };
  const user = userEvent.setup({ delay: null });
  const view = render(
    <SWRConfig value={{ provider: () => new Map(), dedupingInterval: 0, shouldRetryOnError: false }}>
      <AccountProvider account={account}>
        <TooltipProvider>{element}</TooltipProvider>
      </AccountProvider>
      <Toaster />
    </SWRConfig>,
  );
  return { user, ...view };
}
