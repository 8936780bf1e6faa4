'use client';

import { useState } from 'react';
import { ShareLinkDialog } from '@/components/forms/share-link-dialog';
import { Button } from '@/components/ui/button';
import { TextLink } from '@/components/ui/link-button';
import { Moment } from '@/components/ui/moment';
import { Tag } from '@/components/ui/tag';
import { useMayActAs } from '@/lib/client/account-context';
import { useRevisions } from '@/lib/client/use-revisions';
import type { LayoutSummary } from '@/lib/contracts/layouts';
import type { RevisionSummary } from '@/lib/contracts/revisions';
import { DataPart } from '@/components/ui/data-part';
import { STATE_WORDS } from './state-words';

/** The revisions of one variant, newest first. */
export function LayoutRevisions({ layout }: { layout: LayoutSummary }) {
  const answer = useRevisions(layout.id);
  const mayShare = useMayActAs('integrator');
  const [shared, setShared] = useState<RevisionSummary | null>(null);
  return (
    <div className="border-t border-rule first:border-t-0">
      <h3 className="px-3.5 pt-2.5 pb-1 font-medium">
        {layout.letter} · {layout.name}
      </h3>
      <DataPart answer={answer} loading={`Loading the revisions of ${layout.letter}`}>
        {({ revisions }) => (
          <ul className="pb-1.5">
            {revisions.map((revision) => (
              <li
                key={revision.id}
                className="grid min-h-10 grid-cols-[4.5rem_minmax(0,1fr)_auto] items-center gap-x-3 border-t border-hair px-3.5 py-1.5 first:border-t-0"
              >
                <TextLink href={`/revisions/${revision.id}`} className="font-mono">
                  rev {revision.number}
                </TextLink>
                <div className="min-w-0">
                  <p className="flex flex-wrap items-center gap-x-2 gap-y-0.5">
                    <Tag tone={STATE_WORDS[revision.state].tone}>{STATE_WORDS[revision.state].name}</Tag>
                    <span className="text-sm text-ink-soft">
                      <Moment iso={revision.issuedAt} />, {revision.issuedBy}
                    </span>
                  </p>
                  {revision.note && <p className="truncate text-sm text-ink-soft">{revision.note}</p>}
                </div>
                {mayShare ? (
                  <Button
                    size="small"
                    aria-label={`Share revision ${revision.number} of ${layout.letter}`}
                    onClick={() => setShared(revision)}
                  >
                    Share
                  </Button>
                ) : (
                  <span />
                )}
              </li>
            ))}
          </ul>
        )}
      </DataPart>
      {shared && (
        <ShareLinkDialog
          revisionId={shared.id}
          revisionName={`${layout.letter} · ${layout.name}, rev ${shared.number}`}
          onClose={() => setShared(null)}
        />
      )}
    </div>
  );
}
