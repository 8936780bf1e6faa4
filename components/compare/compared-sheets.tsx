'use client';

import { useMemo, useState } from 'react';
import { MeasureChoice } from '@/components/sheet/map-key/measure-choice';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { type SheetRef } from '@/lib/client/sheet-ref';
import { type AskedDocument } from '@/lib/client/use-sheet-document';
import { mapSettingsSchema, type MapSettings } from '@/lib/layout/map-settings';
import { directionWords, wristWords } from '@/lib/layout/measure-words';
import type { MapScale } from '@/lib/layout/scales';
import type { ComparisonView } from '@/lib/contracts/comparisons';
import { CompareTools, type CompareLook } from './compare-tools';
import { Distributions } from './distributions';
import { ChangedPanel } from './changed-panel';
import { FiguresTable } from './figures-table';
import { RemarksOnSheet, useRemarksOn } from './remarks-on-sheet';
import { shortNames } from './sheet-names';
import { SheetTrio } from './sheet-trio';
import { useComparison } from './use-comparison';
import { useSide } from './use-side';

const UNASKED = mapSettingsSchema.parse({});

interface ComparedSheetsProps {
  readonly projectId: string;
  readonly leftRef: SheetRef | null;
  readonly left: AskedDocument;
  readonly right: AskedDocument;
  readonly third: AskedDocument;
  readonly fourth: AskedDocument;
  /** From the address, and back into it. */
  readonly view: Partial<ComparisonView>;
  readonly onViewChange: (view: Partial<ComparisonView>) => void;
  /** The sheets as the address names them. */
  readonly sheets: readonly string[];
  /** The project has not got two sheets to compare. */
  readonly isEmpty: boolean;
  readonly mayAsk: boolean;
}

/** The comparison itself, once both sheets are there. */
export function ComparedSheets(props: ComparedSheetsProps) {
  const { projectId, leftRef, left, right, third, fourth, isEmpty, mayAsk, sheets } = props;
  const { view: changes, onViewChange: setChanges } = props;
  const [look, setLook] = useState<CompareLook>('beside');
  const [scale, setScale] = useState<MapScale>('tide');
  const settings = useMemo<MapSettings>(
    () => ({ ...(left.document?.settings ?? UNASKED), ...changes }),
    [left.document, changes],
  );
  const leftSide = useSide(left.document, settings, mayAsk);
  const rightSide = useSide(right.document, settings, mayAsk);
  const thirdSide = useSide(third.document, settings, mayAsk);
  const fourthSide = useSide(fourth.document, settings, mayAsk);
  const comparison = useComparison(leftSide, rightSide, settings, thirdSide, fourthSide);
  const remarks = useRemarksOn(leftRef);

  if (isEmpty) {
    return (
      <Panel>
        <EmptyState
          title="There is nothing to compare yet"
          body={
            mayAsk
              ? 'A comparison needs two sheets: two variants, or a variant and one of its revisions. Copy a variant, change it, and come back.'
              : 'A comparison needs two issued revisions.'
          }
          action={<LinkButton href={`/projects/${projectId}`}>Back to the project</LinkButton>}
        />
      </Panel>
    );
  }
  const missing = [left, right].find(({ error }) => error);
  if (missing?.error) {
    return (
      <Notice tone="trouble" title="One of the two sheets could not be read">
        {missing.error.message} Choose another one above.
      </Notice>
    );
  }
  if (!comparison) return <LoadingLine label="Laying the two sheets side by side" />;

  const [leftName, rightName] = shortNames(comparison.left.document, comparison.right.document);
  return (
    <div className="grid gap-3.5">
      <CompareTools
        projectId={projectId}
        name={`${leftName} against ${rightName}`}
        sheets={sheets}
        view={{ measure: settings.measure, wrist: settings.wrist }}
        look={look}
        onLookChange={setLook}
        mayKeep={mayAsk}
      />
      <SheetTrio
        look={look}
        comparison={comparison}
        scale={scale}
        leftRemarks={remarks ?? []}
        measureChoice={
          <MeasureChoice
            measure={settings.measure}
            scale={scale}
            onMeasureChange={(measure) => setChanges({ ...changes, measure })}
            onScaleChange={setScale}
          />
        }
      />
      <div className="grid items-start gap-3.5 lg:grid-cols-[1.55fr_1fr]">
        <Panel
          title="What changes"
          aside={
            <>
              <span>
                {directionWords(settings)}, height {settings.toolHeightMm} mm{mayAsk ? '' : `, ${wristWords(settings)}`}
              </span>
              {mayAsk && (
                <SegmentedControl
                  label="Wrist"
                  value={settings.wrist}
                  onValueChange={(wrist) => setChanges({ ...changes, wrist })}
                  options={[
                    { value: 'held', label: 'Wrist held' },
                    { value: 'free', label: 'Wrist free' },
                  ]}
                />
              )}
            </>
          }
        >
          <FiguresTable
            figures={comparison.figures}
            leftName={leftName}
            rightName={rightName}
            others={comparison.others.map(({ side, figures }) => ({
              name: `${side.document.letter} ${side.document.mark}`,
              figures,
            }))}
          />
          <Distributions comparison={comparison} leftName={leftName} rightName={rightName} />
        </Panel>
        <div>
          <ChangedPanel changed={comparison.changed} />
          <RemarksOnSheet name={leftName} remarks={remarks} />
        </div>
      </div>
    </div>
  );
}
