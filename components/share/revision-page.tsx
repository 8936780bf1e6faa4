'use client';

import { useCallback, useMemo, useState } from 'react';
import { ShareLinkDialog } from '@/components/forms/share-link-dialog';
import { STATE_WORDS } from '@/components/projects/state-words';
import { SubjectFault } from '@/components/shell/subject-fault';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { LoadingLine } from '@/components/ui/loading-line';
import { Moment } from '@/components/ui/moment';
import { TitleBlock } from '@/components/ui/title-block';
import { useAccount, useMayActAs } from '@/lib/client/account-context';
import { documentOfRevision } from '@/lib/client/sheet-document';
import { useRevision, useRevisionReview } from '@/lib/client/use-review';
import { useSignOffs } from '@/lib/client/use-sign-offs';
import { usePeople } from '@/lib/client/use-people';
import { useStoredMaps } from '@/lib/client/use-stored-maps';
import type { Person } from '@/lib/contracts/remarks';
import type { Revision } from '@/lib/contracts/revisions';
import { Review } from './review';
import { RevisionActions } from './revision-actions';

/** An issued revision for those who are signed in: the customer's view, with what a member may do besides. */
export default function RevisionPage({ revisionId }: { readonly revisionId: string }) {
  const { data, error, mutate } = useRevision(revisionId);
  if (error && !data) return <SubjectFault error={error} what="This revision" onRetry={() => void mutate()} />;
  return data ? <Opened revision={data} /> : <LoadingLine label="Opening the revision" />;
}

const NOBODY: readonly Person[] = [];

function Opened({ revision }: { readonly revision: Revision }) {
  const { id, projectId, snapshot, number, issuedAt, issuedBy } = revision;
  const { role } = useAccount();
  const signOffs = useSignOffs(`/api/revisions/${encodeURIComponent(id)}`);
  const state = signOffs.now?.state ?? revision.state;
  const mayShare = useMayActAs('integrator');
  const mayEdit = useMayActAs('planner');
  const [isSharing, setSharing] = useState(false);
  const document = useMemo(() => documentOfRevision(revision), [revision]);
  const maps = useStoredMaps('/api/maps', snapshot.maps);
  const review = useRevisionReview(id, mayEdit);
  const people = usePeople(projectId);
  const planId = snapshot.floorPlan?.id ?? '';
  const pictureUrl = useCallback((width: number) => `/api/floor-plans/${planId}/picture?width=${width}`, [planId]);
  return (
    <div className="flex min-h-dvh flex-col bg-sheet lg:h-dvh">
      <TitleBlock
        cells={[
          { label: 'Project', value: snapshot.projectName, href: `/projects/${projectId}`, wideOnly: true },
          { label: 'Variant', value: `${snapshot.letter} · ${snapshot.name}`, heading: true },
          { label: 'Revision', value: number, kind: 'figure' },
          { label: 'State', value: STATE_WORDS[state].name, tone: 'petrol' },
          {
            label: 'Issued',
            value: (
              <>
                <Moment iso={issuedAt} /> by {issuedBy}
              </>
            ),
            wideOnly: true,
          },
        ]}
        actions={
          <>
            <LinkButton href={`/revisions/${id}/hand-over`} className={mayEdit ? 'max-sm:hidden' : undefined}>
              Hand over
            </LinkButton>
            {mayEdit && <RevisionActions revision={revision} />}
            {mayShare && (
              <Button variant="action" onClick={() => setSharing(true)}>
                Share
              </Button>
            )}
          </>
        }
      />
      <main className="flex min-h-0 flex-1 flex-col">
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
            number,
            maySign: role === 'viewer',
            mayRemark: true,
            people: people.data?.people ?? NOBODY,
            asGuest: false,
          }}
        />
      </main>
      {isSharing && (
        <ShareLinkDialog revisionId={id} revisionName={`revision ${number}`} onClose={() => setSharing(false)} />
      )}
    </div>
  );
}
