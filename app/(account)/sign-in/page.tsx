import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { SignInForm } from '@/components/forms/sign-in-form';
import { Panel } from '@/components/ui/panel';
import { localPath } from '@/lib/client/local-path';
import { readMember } from '../../read-member';

export const metadata: Metadata = { title: 'Sign in' };

type Query = Promise<{ return?: string | string[]; callbackUrl?: string | string[] }>;

export default async function SignInPage({ searchParams }: { searchParams: Query }) {
  const query = await searchParams;
  const asked = query.return ?? query.callbackUrl;
  const returnTo = localPath(Array.isArray(asked) ? asked[0] : asked);
  if (await readMember()) redirect(returnTo);
  return (
    <Panel title="Sign in" level={1} padded>
      <SignInForm returnTo={returnTo} />
    </Panel>
  );
}
