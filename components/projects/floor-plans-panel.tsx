'use client';

import { Upload } from 'lucide-react';
import { useRouter } from 'next/navigation';
import { useCallback, useRef, useState, type DragEvent } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { Progress } from '@/components/ui/progress';
import { toast } from '@/components/ui/toaster';
import { useFloorPlans } from '@/lib/client/use-floor-plans';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import { DataPart } from '@/components/ui/data-part';
import { FloorPlanRow } from './floor-plan-row';
import { useUploads } from './use-uploads';

const ACCEPTED = 'image/png,image/jpeg,image/webp,.png,.jpg,.jpeg,.webp';

/** The floor plans of the project: upload by button or drop, set to scale, rename, delete. */
export function FloorPlansPanel({ projectId }: { projectId: string }) {
  const router = useRouter();
  const answer = useFloorPlans(projectId);
  const chooser = useRef<HTMLInputElement>(null);
  const [isOver, setIsOver] = useState(false);
  const onStored = useCallback(
    (floorPlan: FloorPlan) =>
      toast.success(`${floorPlan.name} is uploaded`, {
        action: {
          label: 'Set to scale',
          onClick: () => router.push(`/projects/${projectId}/floor-plans/${floorPlan.id}`),
        },
      }),
    [router, projectId],
  );
  const { uploads, start, putAway } = useUploads(projectId, onStored);
  const floorPlans = answer.data?.floorPlans ?? [];

  const take = (files: FileList | null): void => {
    for (const file of files ?? []) void start(file);
  };
  const onDrop = (event: DragEvent): void => {
    event.preventDefault();
    setIsOver(false);
    take(event.dataTransfer.files);
  };
  const button = (
    <Button
      size="small"
      variant={answer.data && floorPlans.length === 0 ? 'action' : 'plain'}
      onClick={() => chooser.current?.click()}
    >
      <Upload aria-hidden className="size-4" />
      Upload
    </Button>
  );

  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setIsOver(true);
      }}
      onDragLeave={() => setIsOver(false)}
      onDrop={onDrop}
    >
      <Panel
        title="Floor plans"
        aside={floorPlans.length > 0 && button}
        className={classNames(isOver && 'outline-2 outline-petrol outline-dashed')}
      >
        <input
          ref={chooser}
          type="file"
          multiple
          accept={ACCEPTED}
          aria-label="Floor plan file"
          className="sr-only"
          tabIndex={-1}
          onChange={(event) => {
            take(event.target.files);
            // So that the same file can be chosen again after a refusal.
            event.target.value = '';
          }}
        />
        {uploads.length > 0 && (
          <ul className="flex flex-col gap-3 border-b border-hair p-3.5">
            {uploads.map((one) => (
              <li key={one.id}>
                {one.refusal ? (
                  <Notice
                    tone="trouble"
                    title={`${one.name} was not taken in`}
                    action={
                      <Button size="small" onClick={() => putAway(one.id)}>
                        Put away
                      </Button>
                    }
                  >
                    {one.refusal}
                  </Notice>
                ) : (
                  <Progress
                    label={one.share < 1 ? `Uploading ${one.name}` : `Checking ${one.name}`}
                    share={one.share}
                    action={
                      <Button size="small" variant="quiet" onClick={one.cancel}>
                        Cancel
                      </Button>
                    }
                  />
                )}
              </li>
            ))}
          </ul>
        )}
        <DataPart answer={answer} loading="Loading the floor plans">
          {() =>
            floorPlans.length === 0 ? (
              <EmptyState
                title="No floor plan yet"
                body="Upload a picture of the floor (PNG, JPEG or WebP, up to 40 MB), or drop it here. Then set it to scale with two points of known distance."
                action={button}
              />
            ) : (
              <ul>
                {floorPlans.map((floorPlan) => (
                  <FloorPlanRow key={floorPlan.id} floorPlan={floorPlan} />
                ))}
              </ul>
            )
          }
        </DataPart>
        {floorPlans.length > 0 && (
          <p className="border-t border-hair px-3.5 py-2 text-sm text-ink-soft">
            Or drop PNG, JPEG or WebP files here.
          </p>
        )}
      </Panel>
    </div>
  );
}
