'use client';

import { MailRhythmChoice } from '@/components/forms/mail-rhythm-choice';
import { Dialog } from '@/components/ui/dialog';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { send } from '@/lib/client/fetcher';
import { useAnswer } from '@/lib/client/use-answer';
import { mailChoiceSchema } from '@/lib/contracts/mail-choices';

/** How often somebody signed in wants mails. Mount it to open it. */
export function MailDialog({ onClose }: { readonly onClose: () => void }) {
  const { data, error, mutate } = useAnswer('/api/account/mails', mailChoiceSchema);
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="Mails about remarks, issues and sign-offs">
      {error && <Notice tone="trouble">{error.message}</Notice>}
      {!data && !error && <LoadingLine label="Reading your choice" />}
      {data && (
        <MailRhythmChoice
          choice={data.choice}
          onChoose={async (choice) => {
            await mutate(await send('PUT', '/api/account/mails', { choice }, mailChoiceSchema), { revalidate: false });
          }}
        />
      )}
    </Dialog>
  );
}
