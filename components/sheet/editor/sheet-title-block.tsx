'use client';

import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { TitleBlock } from '@/components/ui/title-block';
import { useMayActAs } from '@/lib/client/account-context';
import { drawingRatio } from '@/lib/layout/viewport';
import { useBoard, useView } from './board-context';
import { SaveState } from './save-state';

interface SheetTitleBlockProps {
  readonly onConflict: () => void;
  readonly onShare: () => void;
  readonly onIssue: () => void;
}

/** The page header is the title block of the drawing. */
export function SheetTitleBlock({ onConflict, onShare, onIssue }: SheetTitleBlockProps) {
  const { layout, projectId } = useBoard();
  const mayIssue = useMayActAs('integrator');
  const { letter, name, projectName, latestRevision } = layout;
  return (
    <TitleBlock
      cells={[
        { label: 'Project', value: projectName, href: `/projects/${projectId}` },
        { label: 'Variant', value: `${letter} · ${name}`, heading: true },
        { label: 'Sheet rev.', value: latestRevision?.number ?? '–', kind: 'figure', wideOnly: true },
        { label: 'Scale', value: <Scale />, kind: 'figure', wideOnly: true },
        { label: 'State', value: <SaveState onConflict={onConflict} /> },
      ]}
      actions={
        <>
          <LinkButton variant="quiet" size="small" href={`/projects/${projectId}/compare?left=layout:${layout.id}`}>
            Compare
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
      }
    />
  );
}

function Scale() {
  const { viewport } = useView();
  return <span data-scale={drawingRatio(viewport)}>1 : {drawingRatio(viewport)}</span>;
}
