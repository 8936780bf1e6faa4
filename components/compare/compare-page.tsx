'use client';

import { useMemo } from 'react';
import { useRouter, useSearchParams } from 'next/navigation';
import { SubjectFault } from '@/components/shell/subject-fault';
import { Page } from '@/components/ui/page';
import { TitleBlock } from '@/components/ui/title-block';
import { useMayActAs } from '@/lib/client/account-context';
import { comparisonViewSchema, type ComparisonView } from '@/lib/contracts/comparisons';
import { parseSheetRef, sheetRefText, type SheetRef } from '@/lib/client/sheet-ref';
import { useProject } from '@/lib/client/use-project';
import { useSheetChoices } from '@/lib/client/use-sheet-choices';
import { useSheetDocument } from '@/lib/client/use-sheet-document';
import { SheetPicker } from './sheet-picker';
import { chosenSheets } from './chosen-sheets';
import { ComparedSheets } from './compared-sheets';

type Side = 'left' | 'right' | 'third' | 'fourth';

/** What the address chooses; a member that it leaves out is left out here too, or it would cover the sheet's own. */
function viewOf(measure: string | null, wrist: string | null): Partial<ComparisonView> {
  const chosen = { ...(measure !== null && { measure }), ...(wrist !== null && { wrist }) };
  return comparisonViewSchema.partial().catch({}).parse(chosen);
}

/** Two sheets of a project side by side: map against map, number against number, thing against thing. */
export default function ComparePage({ projectId }: { readonly projectId: string }) {
  const router = useRouter();
  const search = useSearchParams();
  const mayAsk = useMayActAs('planner');
  const project = useProject(projectId);
  const { choices, error: choicesError, tryAgain } = useSheetChoices(projectId);
  const [leftRef, rightRef] = chosenSheets(search, choices, mayAsk);
  const leftAsked = useSheetDocument(leftRef);
  const rightAsked = useSheetDocument(rightRef);
  const [thirdRef, fourthRef] = [parseSheetRef(search.get('third')), parseSheetRef(search.get('fourth'))];
  const thirdAsked = useSheetDocument(thirdRef);
  const fourthAsked = useSheetDocument(fourthRef);
  const [measureText, wristText] = [search.get('measure'), search.get('wrist')];
  const view = useMemo(() => viewOf(measureText, wristText), [measureText, wristText]);
  const sheets = [leftRef, rightRef, thirdRef, fourthRef].flatMap((ref) => (ref ? sheetRefText(ref) : []));

  const fault = project.error ?? choicesError;
  if (fault) {
    return (
      <SubjectFault
        error={fault}
        onRetry={() => {
          void project.mutate();
          tryAgain();
        }}
      />
    );
  }
  const goTo = (changes: Record<string, string | undefined>) => {
    const next = new URLSearchParams(search);
    if (leftRef) next.set('left', sheetRefText(leftRef));
    if (rightRef) next.set('right', sheetRefText(rightRef));
    for (const [name, value] of Object.entries(changes)) {
      if (value) next.set(name, value);
      else next.delete(name);
    }
    router.replace(`?${next}`, { scroll: false });
  };
  // The same one again takes a further sheet out of the table.
  const choose = (side: Side) => (ref: string) => goTo({ [side]: ref === search.get(side) ? undefined : ref });
  const picker = (label: string, chosen: SheetRef | null, side: Side) =>
    choices ? (
      <SheetPicker label={label} choices={choices} chosen={chosen} withDrafts={mayAsk} onChoose={choose(side)} />
    ) : (
      '…'
    );
  return (
    <>
      <TitleBlock
        cells={[
          {
            label: 'Project',
            value: project.data?.name ?? '…',
            href: `/projects/${projectId}`,
            heading: true,
            wideOnly: true,
          },
          { label: 'Left sheet', value: picker('Left sheet', leftRef, 'left') },
          { label: 'Right sheet', value: picker('Right sheet', rightRef, 'right') },
          { label: 'Also in the table', value: picker('Third sheet', thirdRef, 'third'), wideOnly: true },
          ...(thirdRef ? [{ label: 'And', value: picker('Fourth sheet', fourthRef, 'fourth'), wideOnly: true }] : []),
        ]}
      />
      <Page>
        <ComparedSheets
          projectId={projectId}
          leftRef={leftRef}
          left={leftAsked}
          right={rightAsked}
          third={thirdAsked}
          fourth={fourthAsked}
          sheets={sheets}
          view={view}
          onViewChange={goTo}
          isEmpty={choices !== null && !(leftRef && rightRef)}
          mayAsk={mayAsk}
        />
      </Page>
    </>
  );
}
