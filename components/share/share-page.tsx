'use client';

import { useCallback, useMemo } from 'react';
import { STATE_WORDS } from '@/components/projects/state-words';
import { Button } from '@/components/ui/button';
import { LoadingLine } from '@/components/ui/loading-line';
import { TitleBlock } from '@/components/ui/title-block';
import { Moment } from '@/components/ui/moment';
import { StopPage } from '@/components/shell/stop-page';
import type { Person } from '@/lib/contracts/remarks';
import type { SharedRevision } from '@/lib/contracts/share-links';
import { documentOfRevision } from '@/lib/client/sheet-document';
import { useSharedReview, useSharedRevision } from '@/lib/client/use-review';
import { useSignOffs } from '@/lib/client/use-sign-offs';
import { useStoredMaps } from '@/lib/client/use-stored-maps';
import { Review } from './review';

/** What a customer sees behind a share link. */
export default function SharePage({ token }: { readonly token: string }) {
  const { data, error, isLoading, mutate } = useSharedRevision(token);
  if (data) return <Shared token={token} shared={data} />;
  if (error && [400, 404, 410, 422].includes(error.status)) return <DeadLink />;
  if (error) {
    return (
      <StopPage
        title="The drawing could not be read"
        actions={<Button onClick={() => void mutate()}>Try again</Button>}
      >
        <p>{error.message}</p>
      </StopPage>
    );
  }
  return <LoadingLine label={isLoading ? 'Opening the drawing' : 'Waiting'} />;
}

/** A link that opens nothing says whom to ask; it does not say which of the reasons holds. */
function DeadLink() {
  return (
    <StopPage title="This link does not open a drawing" actions={null}>
      <p>It has expired, was withdrawn, or is not complete: a long link is easily cut in two in a mail.</p>
      <p className="mt-2">
        Ask the person who sent it to you for a new one. Remarks that you have pinned are kept with the drawing.
      </p>
    </StopPage>
  );
}

const NOBODY: readonly Person[] = [];

function Shared({ token, shared }: { readonly token: string; readonly shared: SharedRevision }) {
  const { revision, organisationName, customerName, mayRemark, maySign, expiresAt, newerNumber } = shared;
  const { snapshot } = revision;
  const document = useMemo(() => documentOfRevision(revision), [revision]);
  const base = `/api/share/${encodeURIComponent(token)}`;
  const maps = useStoredMaps(`${base}/maps`, snapshot.maps);
  const review = useSharedReview(token);
  const pictureUrl = useCallback((width: number) => `${base}/picture?width=${width}`, [base]);
  const signOffs = useSignOffs(base);
  const state = STATE_WORDS[signOffs.now?.state ?? revision.state];
  return (
    <div className="flex min-h-dvh flex-col bg-sheet lg:h-dvh">
      <TitleBlock
        cells={[
          { label: 'Project', value: snapshot.projectName, wideOnly: true },
          { label: 'Variant', value: `${snapshot.letter} · ${snapshot.name}`, heading: true },
          { label: 'Revision', value: revision.number, kind: 'figure' },
          { label: 'State', value: state.name, tone: 'petrol', kind: 'text' },
          { label: 'Drawn by', value: organisationName, wideOnly: true },
          { label: 'Link works until', value: <Moment iso={expiresAt} />, wideOnly: true },
        ]}
        actions={<span className="truncate text-ink-soft">{customerName && `for ${customerName}`}</span>}
      />
      <main className="flex min-h-0 flex-1 flex-col">
        {newerNumber !== null && (
          <p className="border-b border-rule bg-petrol-wash px-3.5 py-2">
            Revision {newerNumber} has been issued since. Ask {organisationName} for the link to it.
          </p>
        )}
        <Review
          subject={{
            document,
            note: revision.note,
            maps: maps.data ?? null,
            mapsError: maps.error,
            pictureUrl,
            review,
            signOffs,
            sha256: revision.sha256,
            number: revision.number,
            maySign,
            mayRemark,
            people: NOBODY,
            asGuest: true,
          }}
        />
      </main>
    </div>
  );
}
