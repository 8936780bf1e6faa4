'use client';

import { useState } from 'react';
import { useSheetReading } from '@/components/sheet/reader/use-sheet-reading';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import type { FloorPoint } from '@/lib/layout/viewport';
import { MapLine } from './map-line';
import { RemarkForm } from './remark-form';
import { RemarkList } from './remark-list';
import { ReviewDrawing } from './review-drawing';
import type { ReviewSubject } from './review-subject';
import { SignOffBar } from './sign-off-bar';
import { SignOffList } from './sign-off-list';
import { TaskPointTable } from './task-point-table';
import { useReviewMap } from './use-review-map';

interface NewSpot extends FloorPoint {
  readonly itemId: string | null;
}

/** A frozen revision to look at and remark on: drawing, key, verdicts, remarks. On a phone one below another. */
export function Review({ subject }: { readonly subject: ReviewSubject }) {
  const { document, review, mayRemark, asGuest } = subject;
  const reading = useSheetReading(document, document.settings.wrist);
  const reviewMap = useReviewMap(document, reading?.robots ?? [], subject.maps);
  // A mail and the table of remarks lead to one remark.
  const [chosenId, setChosenId] = useState(() => new URLSearchParams(window.location.search).get('remark'));
  const [spot, setSpot] = useState<NewSpot | null>(null);
  if (!reading) return null;

  const { verdicts, robots } = reading;
  const met = verdicts.filter(({ best }) => best?.met).length;
  const openCount = (review.remarks ?? []).filter(({ resolvedAt }) => resolvedAt === null).length;
  const things = document.items.filter(
    ({ hidden, kind }) => !hidden && !['dimension', 'sectionLine', 'note'].includes(kind),
  );

  const pinSpot = (point: FloorPoint, itemId: string | null) => {
    setChosenId(null);
    setSpot({ xMm: Math.round(point.xMm), yMm: Math.round(point.yMm), itemId });
  };
  return (
    <div className="flex min-h-0 flex-1 flex-col lg:flex-row">
      <div className="h-[min(25rem,56dvh)] flex-none border-b border-rule lg:h-auto lg:min-h-0 lg:flex-1 lg:border-b-0">
        <ReviewDrawing
          subject={subject}
          reading={reading}
          reviewMap={reviewMap}
          chosenId={chosenId}
          onChoose={(id) => {
            setSpot(null);
            setChosenId(id);
          }}
          spot={spot}
          onSpot={(point) => pinSpot(point, null)}
        />
      </div>
      <div className="bg-sheet lg:w-[26rem] lg:flex-none lg:overflow-y-auto lg:border-l lg:border-rule">
        {spot && (
          <div className="grid gap-2 border-b border-rule px-3.5 py-3">
            <div className="flex flex-wrap items-baseline justify-between gap-2">
              <h2 className="font-semibold">Remark on this spot</h2>
              <p className="font-mono text-sm text-ink-soft">
                x {spot.xMm} y {spot.yMm} mm
              </p>
            </div>
            <RemarkForm
              label="Your remark"
              sendLabel="Pin the remark"
              takesFocus={spot.itemId !== null}
              asGuest={asGuest}
              people={subject.people}
              withPicture
              onSend={async (said, guest, picture) => {
                const pinned = await review.pin({ ...spot, ...said }, guest);
                setSpot(null);
                // Pinned is pinned: should the picture be refused, it can be attached to the open remark again.
                setChosenId(pinned.id);
                if (picture) await review.attach(pinned.id, picture);
              }}
              onCancel={() => setSpot(null)}
            />
          </div>
        )}
        <MapLine settings={document.settings} reviewMap={reviewMap} absence={absenceOf(subject)} />
        <p className="flex flex-wrap justify-between gap-x-4 border-y border-hair px-3.5 py-2.5 font-semibold">
          <span>
            <span className="font-mono">{met}</span> of <span className="font-mono">{verdicts.length}</span> task points
            met
          </span>
        </p>
        <Panel
          title="Remarks"
          aside={<span className="font-mono text-ink">{review.remarks ? `${openCount} open` : ''}</span>}
          className="border-x-0 border-t-0"
        >
          <RemarkList
            review={review}
            mayRemark={mayRemark}
            asGuest={asGuest}
            people={subject.people}
            number={subject.number}
            chosenId={chosenId}
            onChoose={(id) => {
              setSpot(null);
              setChosenId(id);
            }}
          />
          {mayRemark && !spot && things.length > 0 && (
            <div className="border-t border-hair px-3.5 py-2.5">
              <Select
                aria-label="Remark on a thing"
                placeholder="Tap the drawing, or choose what it is about"
                value={undefined}
                onValueChange={(id) => {
                  const item = things.find((thing) => thing.id === id);
                  if (item) pinSpot(item, item.id);
                }}
                options={things.map(({ id, name }) => ({ value: id, label: name }))}
              />
            </div>
          )}
        </Panel>
        <SignOffList signOffs={subject.signOffs.now?.signOffs ?? []} />
        <Panel title="Task points" className="border-x-0 border-t-0">
          <TaskPointTable verdicts={verdicts} robots={robots} />
        </Panel>
        {subject.note && (
          <section className="border-b border-hair px-3.5 py-2.5">
            <h2 className="text-sm text-ink-soft">Note with this revision</h2>
            <p className="whitespace-pre-wrap">{subject.note}</p>
          </section>
        )}
        <p className="px-3.5 py-3 text-sm leading-snug text-ink-soft">
          Planning figures, computed from the data typed in. Guarding, stopping distances and protective devices need a
          risk assessment, measured stopping times, local codes and licensed or competent persons.
        </p>
        {subject.maySign && !spot && (
          <SignOffBar signOffs={subject.signOffs} sha256={subject.sha256} number={subject.number} asGuest={asGuest} />
        )}
      </div>
    </div>
  );
}

/** Why there is no map under the linework; null where there is one. */
function absenceOf({ document, maps, mapsError }: ReviewSubject): string | null {
  if (maps && maps.size > 0) return null;
  if (mapsError) return `The map could not be read. ${mapsError.message}`;
  if (document.storedMaps.length === 0) return 'This revision was issued without a map.';
  return 'Reading the map…';
}
