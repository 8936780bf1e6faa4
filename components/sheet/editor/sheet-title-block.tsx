'use client';

import { ChevronDown } from 'lucide-react';
import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Menu, MenuItem } from '@/components/ui/menu';
import { TitleBlock } from '@/components/ui/title-block';
import { useMayActAs } from '@/lib/client/account-context';
import { useRevisions } from '@/lib/client/use-revisions';
import type { Layout } from '@/lib/contracts/layouts';
import { drawingRatio } from '@/lib/layout/viewport';
import { useBoard, useView } from './board-context';
import { SaveState } from './save-state';
import { NARROW, useMedia } from './use-media';

interface SheetTitleBlockProps {
  readonly onConflict: () => void;
  readonly onShare: () => void;
  readonly onIssue: () => void;
}

/** The page header is the title block of the drawing. */
export function SheetTitleBlock({ onConflict, onShare, onIssue }: SheetTitleBlockProps) {
  const { layout, projectId } = useBoard();
  const mayIssue = useMayActAs('integrator');
  const isNarrow = useMedia(NARROW);
  const compareHref = `/projects/${projectId}/compare?left=layout:${layout.id}`;
  const handOverHref = `/projects/${projectId}/layouts/${layout.id}/hand-over`;
  const { letter, name, projectName } = layout;
  const newest = useNewestRevision(layout);
  return (
    <TitleBlock
      cells={[
        { label: 'Project', value: projectName, href: `/projects/${projectId}` },
        { label: 'Variant', value: `${letter} · ${name}`, heading: true },
        { label: 'Sheet rev.', value: newest ?? '–', kind: 'figure', wideOnly: true },
        { label: 'Scale', value: <Scale />, kind: 'figure', wideOnly: true },
        { label: 'State', value: <SaveState onConflict={onConflict} /> },
      ]}
      actions={
        isNarrow ? (
          <NarrowActions
            compareHref={compareHref}
            handOverHref={handOverHref}
            onShare={mayIssue ? onShare : null}
            onIssue={mayIssue ? onIssue : null}
          />
        ) : (
          <>
            <LinkButton variant="quiet" size="small" href={compareHref}>
              Compare
            </LinkButton>
            <LinkButton variant="quiet" size="small" href={handOverHref}>
              Hand over
            </LinkButton>
            {mayIssue && (
              <>
                <Button variant="quiet" size="small" onClick={onShare}>
                  Share
                </Button>
                <Button variant="action" onClick={onIssue}>
                  Issue for review
                </Button>
              </>
            )}
          </>
        )
      }
    />
  );
}

/** A colleague may issue while the sheet is open; asked for this often. */
const ASK_EVERY_MS = 15_000;

/** The number of the newest revision: as the sheet was opened, until the list of revisions knows better. */
function useNewestRevision({ id, latestRevision }: Layout): number | null {
  const { data } = useRevisions(id, { refreshInterval: ASK_EVERY_MS });
  const numbers = data?.revisions.map(({ number }) => number) ?? [];
  return numbers.length > 0 ? Math.max(...numbers) : (latestRevision?.number ?? null);
}

interface NarrowActionsProps {
  readonly compareHref: string;
  readonly handOverHref: string;
  /** Null where the reader may not. */
  readonly onShare: (() => void) | null;
  readonly onIssue: (() => void) | null;
}

/** On a phone the actions fold into one button. */
function NarrowActions({ compareHref, handOverHref, onShare, onIssue }: NarrowActionsProps) {
  return (
    <Menu
      trigger={
        <Button size="small">
          Sheet
          <ChevronDown aria-hidden className="size-4" />
        </Button>
      }
    >
      <MenuItem asChild>
        <Link href={compareHref}>Compare</Link>
      </MenuItem>
      <MenuItem asChild>
        <Link href={handOverHref}>Hand over</Link>
      </MenuItem>
      {onShare && <MenuItem onSelect={onShare}>Share</MenuItem>}
      {onIssue && <MenuItem onSelect={onIssue}>Issue for review</MenuItem>}
    </Menu>
  );
}

function Scale() {
  const { viewport } = useView();
  return <span data-scale={drawingRatio(viewport)}>1 : {drawingRatio(viewport)}</span>;
}
