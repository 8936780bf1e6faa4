'use client';

import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { useBoard, useBoardSheet } from './board-context';
import { useProjectFloorPlans } from './floor-plan-choice';
import { usePlace } from './use-place';

/** On a sheet that lacks its floor plan or its first robot: what to do next, over the empty canvas. */
export function NextStep() {
  const { projectId, floorPlan, chooseFloorPlan, sheet } = useBoard();
  const { data } = useProjectFloorPlans(projectId);
  const items = useBoardSheet((state) => state.items);
  const toolName = useBoardSheet((state) => state.tool.name);
  const { placeAtOnce } = usePlace();
  if (!data || toolName !== 'select' || items.size > 0) return null;
  const plans = data.floorPlans;

  if (floorPlan && !floorPlan.calibration) {
    return (
      <Card>
        <EmptyState
          title="The floor plan has no scale yet"
          body="Set it to scale with two points of known distance; then it lies under the sheet."
          action={
            <LinkButton variant="action" href={`/projects/${projectId}/floor-plans/${floorPlan.id}`}>
              Set it to scale
            </LinkButton>
          }
        />
      </Card>
    );
  }
  if (!floorPlan) {
    const [first] = plans;
    return (
      <Card>
        <EmptyState
          title="No floor plan under this sheet"
          body={
            first
              ? 'Lay one of the project’s floor plans under it, or start on the bare grid.'
              : 'Upload the floor plan of the cell first, or start on the bare grid.'
          }
          action={
            <>
              {first ? (
                <Button variant="action" onClick={() => void chooseFloorPlan(first.id)}>
                  Lay “{first.name}” under it
                </Button>
              ) : (
                <LinkButton variant="action" href={`/projects/${projectId}#floor-plans`}>
                  Upload a floor plan
                </LinkButton>
              )}
              <Button onClick={() => placeAtOnce('robot')}>Place a robot</Button>
            </>
          }
        />
      </Card>
    );
  }
  return (
    <Card>
      <EmptyState
        title="No robot on this sheet"
        body="Place the first one; its reach and its map follow by themselves."
        action={
          <Button
            variant="action"
            onClick={() => {
              placeAtOnce('robot');
              sheet.say('Robot placed in the middle of the view. Drag it, or type its place.');
            }}
          >
            Place a robot
          </Button>
        }
      />
    </Card>
  );
}

function Card({ children }: { readonly children: React.ReactNode }) {
  return (
    <div className="pointer-events-none absolute inset-x-4 top-[18%] z-10 flex justify-center">
      <div className="pointer-events-auto max-w-md border border-rule bg-sheet">{children}</div>
    </div>
  );
}
