'use client';

import dynamic from 'next/dynamic';
import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';
import { SubjectFault } from '@/components/shell/subject-fault';
import { Button } from '@/components/ui/button';
import { formatFigure } from '@/components/ui/format-figure';
import { LinkButton } from '@/components/ui/link-button';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { TitleBlock } from '@/components/ui/title-block';
import { toast } from '@/components/ui/toaster';
import { useSize } from '@/components/ui/use-size';
import { sayError } from '@/lib/client/fetcher';
import { useFloorPlan, useFloorPlanActions } from '@/lib/client/use-floor-plans';
import { useProject } from '@/lib/client/use-project';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import { CalibrationResult } from './calibration-result';
import { CalibrationSteps } from './calibration-steps';
import { useCalibration } from './use-calibration';

// The canvas library needs a browser.
const CalibrationStage = dynamic(() => import('./calibration-stage').then((module) => module.CalibrationStage), {
  ssr: false,
  loading: () => <LoadingLine label="Opening the picture" />,
});

interface CalibrationPageProps {
  projectId: string;
  floorPlanId: string;
}

/** Sets a floor plan to scale. */
export function CalibrationPage({ projectId, floorPlanId }: CalibrationPageProps) {
  const { data: floorPlan, error, mutate } = useFloorPlan(floorPlanId);
  if (floorPlan) return <Workbench projectId={projectId} floorPlan={floorPlan} />;
  if (error) return <SubjectFault what="This floor plan" error={error} onRetry={() => void mutate()} />;
  return (
    <>
      <TitleBlock cells={[{ label: 'Floor plan', value: '…', heading: true }]} />
      <LoadingLine label="Loading the floor plan" />
    </>
  );
}

function Workbench({ projectId, floorPlan }: { projectId: string; floorPlan: FloorPlan }) {
  const router = useRouter();
  const { data: project } = useProject(projectId);
  const actions = useFloorPlanActions(projectId);
  const calibration = useCalibration(floorPlan);
  const [watch, size] = useSize();
  const [isSaving, setIsSaving] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const { result, request, changed, faults, deeds } = calibration;
  useWarningBeforeLeaving(changed);

  const save = async (): Promise<void> => {
    if (!request) {
      const unfinished = (['scale', 'check', 'level'] as const).find((line) => faults[line]);
      if (unfinished) deeds.openStep(unfinished);
      setFault(unfinished ? `${faults[unfinished]} Or clear that step.` : 'Pick two points whose distance you know.');
      return;
    }
    setIsSaving(true);
    setFault(null);
    try {
      await actions.change(floorPlan.id, { calibration: request });
      deeds.saved();
      toast.success(`${floorPlan.name} is to scale`, {
        action: { label: 'Back to the project', onClick: () => router.push(`/projects/${projectId}`) },
      });
    } catch (error) {
      setFault(sayError(error));
    } finally {
      setIsSaving(false);
    }
  };

  return (
    <div className="flex min-h-dvh flex-col lg:h-dvh">
      <TitleBlock
        cells={[
          { label: 'Project', value: project?.name ?? '…', href: `/projects/${projectId}` },
          { label: 'Floor plan', value: floorPlan.name, heading: true },
          {
            label: 'Picture',
            value: `${floorPlan.widthPx} × ${floorPlan.heightPx} px`,
            kind: 'figure',
            wideOnly: true,
          },
          {
            label: 'Scale',
            value: result ? `${formatFigure(result.mmPerPx, { decimals: 3 })} mm/px` : 'not set',
            kind: 'figure',
            wideOnly: true,
          },
          {
            label: 'State',
            value: changed ? 'Not saved' : floorPlan.calibration ? 'To scale' : 'No scale yet',
            tone: changed ? 'red' : 'petrol',
            wideOnly: true,
          },
        ]}
        actions={
          <>
            <LinkButton href={`/projects/${projectId}`} variant="quiet" className="max-sm:hidden">
              Back
            </LinkButton>
            <Button variant="action" onClick={save} busy={isSaving} busyLabel="Saving…">
              Save the scale
            </Button>
          </>
        }
      />
      <main className="flex min-h-0 flex-1 flex-col lg:flex-row">
        <div ref={watch} className="relative h-[52dvh] min-w-0 flex-none lg:h-auto lg:flex-1">
          {size && <CalibrationStage floorPlan={floorPlan} calibration={calibration} size={size} />}
        </div>
        <aside
          aria-label="Steps"
          className="min-w-0 flex-none border-t border-rule bg-sheet lg:w-[23rem] lg:overflow-y-auto lg:border-t-0 lg:border-l"
        >
          {fault && (
            <Notice tone="trouble" className="m-3.5">
              {fault}
            </Notice>
          )}
          <CalibrationSteps calibration={calibration} />
          <CalibrationResult result={result} />
          <p className="px-3.5 py-3 text-sm text-ink-soft">
            {floorPlan.calibration
              ? 'Layouts keep their millimetres: with another scale or origin the picture moves under them. Issued revisions keep the scale they were issued with.'
              : 'Drag a point to move it, or select it and press the arrow keys: one pixel a step, ten with Shift.'}
          </p>
        </aside>
      </main>
    </div>
  );
}

/** The browser asks before a page with unsaved points is left. */
function useWarningBeforeLeaving(changed: boolean): void {
  useEffect(() => {
    if (!changed) return undefined;
    const ask = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [changed]);
}
