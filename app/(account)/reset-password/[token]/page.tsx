import type { Metadata } from 'next';
import { ResetPasswordForm } from '@/components/forms/reset-password-form';
import { Panel } from '@/components/ui/panel';

// The address is a key: it must not travel to any other site as a referrer.
export const metadata: Metadata = { title: 'New password', referrer: 'no-referrer' };

export default async function ResetPasswordPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  return (
    <Panel title="Set a new password" level={1} padded>
      <ResetPasswordForm token={token} />
    </Panel>
  );
}
