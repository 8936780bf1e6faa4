'use client';

import { Check, Copy } from 'lucide-react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextInput } from '@/components/ui/text-input';

/** The address of a link just made: it is nowhere else, so it must be copied now. */
export function ShareLinkAddress({ address, onAnother }: { address: string; onAnother: () => void }) {
  const [copied, setCopied] = useState<'yes' | 'refused' | null>(null);
  const copy = async (): Promise<void> => {
    try {
      await navigator.clipboard.writeText(address);
      setCopied('yes');
    } catch {
      // Browsers refuse the clipboard outside https and without permission.
      setCopied('refused');
    }
  };
  return (
    <div className="flex flex-col gap-3">
      <Notice tone="met" title="The link is ready">
        Copy it now and send it to the customer: it is shown this once only. If it gets lost, revoke it and make a new
        one.
      </Notice>
      <Field
        label="Address"
        hint={
          copied === 'refused' ? 'The browser did not let us copy. Select the address and copy it by hand.' : undefined
        }
      >
        <TextInput readOnly value={address} className="font-mono text-sm" onFocus={(event) => event.target.select()} />
      </Field>
      <div className="flex flex-wrap justify-end gap-2">
        <Button variant="quiet" onClick={onAnother}>
          Make another link
        </Button>
        <Button variant="action" onClick={copy} aria-live="polite">
          {copied === 'yes' ? <Check aria-hidden className="size-4" /> : <Copy aria-hidden className="size-4" />}
          {copied === 'yes' ? 'Copied' : 'Copy the address'}
        </Button>
      </div>
    </div>
  );
}
