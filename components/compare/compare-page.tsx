'use client';

import { useRouter, useSearchParams } from 'next/navigation';
import { SubjectFault } from '@/components/shell/subject-fault';
import { Page } from '@/components/ui/page';
import { TitleBlock } from '@/components/ui/title-block';
import { useMayActAs } from '@/lib/client/account-context';
import { sheetRefText, type SheetRef } from '@/lib/client/sheet-ref';
import { useProject } from '@/lib/client/use-project';
import { useSheetChoices } from '@/lib/client/use-sheet-choices';
import { useSheetDocument } from '@/lib/client/use-sheet-document';
import { SheetPicker } from './sheet-picker';
import { chosenSheets } from './chosen-sheets';
import { ComparedSheets } from './compared-sheets';

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
  const choose = (side: 'left' | 'right') => (ref: string) => {
    const next = new URLSearchParams(search);
    if (leftRef) next.set('left', sheetRefText(leftRef));
    if (rightRef) next.set('right', sheetRefText(rightRef));
    next.set(side, ref);
    router.replace(`?${next}`, { scroll: false });
  };
  const picker = (label: string, chosen: SheetRef | null, side: 'left' | 'right') =>
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
        ]}
      />
      <Page>
        <ComparedSheets
          projectId={projectId}
          leftRef={leftRef}
          left={leftAsked}
          right={rightAsked}
          isEmpty={choices !== null && !(leftRef && rightRef)}
          mayAsk={mayAsk}
        />
      </Page>
    </>
  );
}
