'use client';

import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { send } from '@/lib/client/fetcher';
import { useAnswer } from '@/lib/client/use-answer';
import { unsubscribeStateSchema } from '@/lib/contracts/mail-choices';
import { MailRhythmChoice } from './mail-rhythm-choice';

/** Where the link at the end of a mail leads. Opening it changes nothing: mail scanners open links too. */
export function UnsubscribeForm({ token }: { readonly token: string }) {
  const url = `/api/unsubscribe/${encodeURIComponent(token)}`;
  const { data, error, mutate } = useAnswer(url, unsubscribeStateSchema);
  if (error) return <Notice tone="trouble">{error.message}</Notice>;
  if (!data) return <LoadingLine label="Reading your choice" />;
  return (
    <div className="grid gap-3">
      <p className="text-ink-soft">For {data.email}</p>
      <MailRhythmChoice
        choice={data.choice}
        onChoose={async (choice) => {
          await mutate(await send('POST', `${url}?choice=${choice}`, undefined, unsubscribeStateSchema), {
            revalidate: false,
          });
        }}
      />
    </div>
  );
}
