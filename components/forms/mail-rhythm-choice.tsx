'use client';

import { useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { sayError } from '@/lib/client/fetcher';
import type { MailRhythm } from '@/lib/contracts/mail-choices';

interface MailRhythmChoiceProps {
  readonly choice: MailRhythm;
  /** Throws ProblemError; the former choice then stays. */
  readonly onChoose: (choice: MailRhythm) => Promise<void>;
}

const SAID: Record<MailRhythm, string> = {
  at_once: 'You get a mail as soon as something is remarked, issued or signed that concerns you.',
  daily: 'You get one mail a day with all that concerns you, and none on a day without anything.',
  none: 'You get no mails about remarks, issues and sign-offs. Invitations, passwords and receipts still come.',
};

/** At once, once a day, or none; kept with the press. */
export function MailRhythmChoice({ choice, onChoose }: MailRhythmChoiceProps) {
  const [fault, setFault] = useState<string | null>(null);
  const choose = async (next: MailRhythm) => {
    setFault(null);
    try {
      await onChoose(next);
    } catch (error) {
      setFault(sayError(error));
    }
  };
  return (
    <div className="grid gap-3">
      <SegmentedControl
        label="How often"
        value={choice}
        onValueChange={(next) => void choose(next)}
        options={[
          { value: 'at_once', label: 'At once' },
          { value: 'daily', label: 'Once a day' },
          { value: 'none', label: 'None' },
        ]}
        className="w-full"
      />
      <p aria-live="polite">{SAID[choice]}</p>
      {fault && <Notice tone="trouble">{fault}</Notice>}
    </div>
  );
}
