'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { LoadingLine } from '@/components/ui/loading-line';
import { Moment } from '@/components/ui/moment';
import { Notice } from '@/components/ui/notice';
import { Tag } from '@/components/ui/tag';
import { useShareLinkActions, useShareLinks } from '@/lib/client/use-share-links';
import { ShareLinkOpens } from './share-link-opens';
import type { ShareLink } from '@/lib/contracts/share-links';

const nameOf = (link: ShareLink): string => link.label || 'Link without a note';

const rightsOf = ({ mayRemark, maySign }: ShareLink): string =>
  ` · look${mayRemark ? ', remark' : ''}${maySign ? ', sign' : ''}`;

function stateOf(link: ShareLink, now: Date): 'open' | 'revoked' | 'expired' {
  if (link.revokedAt) return 'revoked';
  return new Date(link.expiresAt) <= now ? 'expired' : 'open';
}

/** The links made so far: how often each was opened, until when it works, and the end of it. */
export function ShareLinkList({ revisionId }: { revisionId: string }) {
  const { data, error } = useShareLinks(revisionId);
  const { revoke } = useShareLinkActions(revisionId);
  const [ending, setEnding] = useState<ShareLink | null>(null);
  const now = new Date();
  return (
    <section className="-mx-4 mt-5 -mb-4 border-t border-rule">
      <h3 className="px-4 pt-3 pb-1 font-semibold">Links to this revision</h3>
      {!data && !error && <LoadingLine label="Loading the links" />}
      {error && (
        <Notice tone="trouble" className="m-4">
          {error.message}
        </Notice>
      )}
      {data?.shareLinks.length === 0 && <p className="px-4 pb-4 text-ink-soft">None yet.</p>}
      <ul>
        {data?.shareLinks.map((link) => {
          const state = stateOf(link, now);
          return (
            <li
              key={link.id}
              className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-t border-hair px-4 py-2 first:border-t-0"
            >
              <div className="min-w-0">
                <p className="truncate font-medium">{nameOf(link)}</p>
                <p className="text-sm text-ink-soft">
                  {link.lastOpenedAt ? (
                    <>
                      Opened {link.openCount} times, last <Moment iso={link.lastOpenedAt} />
                    </>
                  ) : (
                    'Not opened yet'
                  )}
                  {state === 'open' && (
                    <>
                      {' '}
                      · works until <Moment iso={link.expiresAt} />
                    </>
                  )}
                  {rightsOf(link)}
                </p>
                <ShareLinkOpens link={link} />
              </div>
              {state === 'open' ? (
                <Button
                  size="small"
                  variant="danger"
                  aria-label={`Revoke ${nameOf(link)}`}
                  onClick={() => setEnding(link)}
                >
                  Revoke
                </Button>
              ) : (
                <Tag>{state === 'revoked' ? 'Revoked' : 'Expired'}</Tag>
              )}
            </li>
          );
        })}
      </ul>
      <ConfirmDialog
        open={ending !== null}
        onOpenChange={(open) => !open && setEnding(null)}
        title="Revoke this link?"
        description={`“${ending ? nameOf(ending) : ''}” stops working at once, and for good. Remarks that came by it stay.`}
        confirmLabel="Revoke link"
        danger
        onConfirm={async () => {
          if (ending) await revoke(ending.id);
        }}
      />
    </section>
  );
}
