import type { Metadata } from 'next';
import { ForgottenPasswordForm } from '@/components/forms/forgotten-password-form';
import { Panel } from '@/components/ui/panel';

export const metadata: Metadata = { title: 'Forgotten password' };

export default function ForgottenPasswordPage() {
  return (
    <Panel title="Forgotten password" level={1} padded>
      <ForgottenPasswordForm />
    </Panel>
  );
}
