'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import { useMayActAs } from '@/lib/client/account-context';
import { sayError } from '@/lib/client/fetcher';
import { useLayouts } from '@/lib/client/use-project';
import { useReportActions } from '@/lib/client/use-reports';
import { exportSubjectSchema } from '@/lib/contracts/exports';
import type { ReportOptions } from '@/lib/contracts/reports';
import type { HandedOver } from './hand-over-page';

const KINDS = [
  { value: 'pdf', label: 'PDF report' },
  { value: 'png', label: 'PNG of the sheet' },
] as const;
const PAPERS = [
  { value: 'A4', label: 'A4, landscape' },
  { value: 'A3', label: 'A3, landscape' },
] as const;
const SCALES = [
  { value: 'fit', label: 'Fit the page' },
  { value: '20', label: '1:20' },
  { value: '50', label: '1:50' },
  { value: '100', label: '1:100' },
] as const;
const COLOURS = [
  { value: 'tide', label: 'Tide' },
  { value: 'plum', label: 'Plum' },
  { value: 'grey', label: 'Grey, for print' },
] as const;

/** Nothing to compare with. */
const ALONE = 'alone';

/** Asks for a report; it is made by a worker and appears in the list. */
export function ReportForm({ sheet }: { readonly sheet: HandedOver }) {
  const { ask } = useReportActions(sheet.subject, sheet.subjectId);
  const [kind, setKind] = useState<ReportOptions['kind']>('pdf');
  const [paper, setPaper] = useState<ReportOptions['paper']>('A4');
  const [scale, setScale] = useState<(typeof SCALES)[number]['value']>('fit');
  const [mapScale, setMapScale] = useState<ReportOptions['mapScale']>('tide');
  const [floorPlan, setFloorPlan] = useState(true);
  const [other, setOther] = useState(ALONE);
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const others = useOthers(sheet);

  const submit = async (): Promise<void> => {
    setBusy(true);
    setFault(null);
    try {
      const [subject, subjectId] = other.split(':');
      const compareWith =
        other === ALONE || kind === 'png' ? null : { subject: exportSubjectSchema.parse(subject), subjectId };
      await ask({ kind, paper, scale: asScale(scale), mapScale, floorPlan, compareWith });
    } catch (error) {
      setFault(sayError(error));
    } finally {
      setBusy(false);
    }
  };
  return (
    <Panel title="Make a report">
      <form
        className="flex flex-col gap-4 px-3.5 py-3"
        onSubmit={(event) => {
          event.preventDefault();
          void submit();
        }}
      >
        {fault && <Notice tone="trouble">{fault}</Notice>}
        <Field label="Kind">
          <Select value={kind} onValueChange={setKind} options={KINDS} />
        </Field>
        <Field label="Paper">
          <Select value={paper} onValueChange={setPaper} options={PAPERS} />
        </Field>
        <Field
          label="Scale"
          hint={
            scale === 'fit'
              ? 'The largest usual scale at which all of the plan fits one page.'
              : kind === 'pdf'
                ? 'Where the plan is larger than the page, its parts follow on pages of their own.'
                : 'Where the plan is larger than the page, the fitting scale is taken.'
          }
        >
          <Select value={scale} onValueChange={setScale} options={SCALES} />
        </Field>
        <Field label="Colours of the map">
          <Select value={mapScale} onValueChange={setMapScale} options={COLOURS} />
        </Field>
        <Checkbox checked={floorPlan} onCheckedChange={setFloorPlan} label="With the floor plan" />
        {kind === 'pdf' && others.length > 0 && (
          <Field label="Compare with" hint="Numbers side by side, and what was moved between the two.">
            <Select
              value={other}
              onValueChange={setOther}
              options={[{ value: ALONE, label: 'No other sheet' }, ...others]}
            />
          </Field>
        )}
        <Button type="submit" variant="action" busy={busy} busyLabel="Asking…">
          {kind === 'pdf' ? 'Make the PDF' : 'Make the PNG'}
        </Button>
      </form>
    </Panel>
  );
}

const asScale = (scale: (typeof SCALES)[number]['value']): ReportOptions['scale'] =>
  scale === 'fit' ? 'fit' : (Number(scale) as 20 | 50 | 100);

/** The other sheets of the project, newest revisions before drafts; drafts for those who see them. */
function useOthers({ projectId, subject, subjectId }: HandedOver): { value: string; label: string }[] {
  const seesDrafts = useMayActAs('planner');
  const { data } = useLayouts(projectId);
  const layouts = data?.layouts ?? [];
  const revisions = layouts.flatMap(({ letter, name, latestRevision }) =>
    latestRevision
      ? [{ value: `revisions:${latestRevision.id}`, label: `${letter} · ${name}, rev ${latestRevision.number}` }]
      : [],
  );
  const drafts = seesDrafts
    ? layouts.map(({ id, letter, name }) => ({ value: `layouts:${id}`, label: `${letter} · ${name}, draft` }))
    : [];
  return [...revisions, ...drafts].filter(({ value }) => value !== `${subject}:${subjectId}`);
}
