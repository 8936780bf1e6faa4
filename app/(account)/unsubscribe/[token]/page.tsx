import type { Metadata } from 'next';
import { UnsubscribeForm } from '@/components/forms/unsubscribe-form';
import { Panel } from '@/components/ui/panel';

// The address is a key: it must not travel to any other site as a referrer.
export const metadata: Metadata = { title: 'Mails', referrer: 'no-referrer' };

export default async function UnsubscribePage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  return (
    <Panel title="How often do you want mails?" level={1} padded>
      <UnsubscribeForm token={token} />
    </Panel>
  );
}
