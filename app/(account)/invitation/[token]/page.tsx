import type { Metadata } from 'next';
import { InvitationForm } from '@/components/forms/invitation-form';
import { Panel } from '@/components/ui/panel';

// The address is a key: it must not travel to any other site as a referrer.
export const metadata: Metadata = { title: 'Invitation', referrer: 'no-referrer' };

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  return (
    <Panel title="Invitation" level={1} padded>
      <InvitationForm token={token} />
    </Panel>
  );
}
