import { changeOf, comparedFigures, verdictOf, type ComparedFigure } from '@/lib/layout/compared-figures';
import { itemDifferences, matchItems } from '@/lib/layout/differences';
import { PRINT_PALETTE } from '@/lib/layout/palette';
import { effectsOf, pointChanges } from '@/lib/layout/verdict-differences';
import type { ReportedSheet } from '@/lib/contracts/reports';
import type { ReportSheet } from '../report-sheet';
import type { Flow, FlowCell } from './flow';

const { green, red, inkSoft } = PRINT_PALETTE;

export const sheetName = ({ snapshot, revision }: ReportedSheet): string =>
  `${snapshot.letter} · ${snapshot.name}, ${revision ? `rev ${revision.number}` : 'draft'}`;

const written = (value: number | null, figure: ComparedFigure, of?: number): string => {
  if (value === null) return '–';
  const text = value.toFixed(figure.decimals).replace('-', '−') + (of === undefined ? '' : ` of ${of}`);
  return figure.unit ? `${text} ${figure.unit}` : text;
};

/** The sheet's own numbers. */
export function figurePages(flow: Flow, sheet: ReportSheet): void {
  flow.heading('Numbers');
  const { measure } = sheet.snapshot.mapSettings;
  const figures = comparedFigures(sheet.figures, sheet.figures, measure, sheet.threshold);
  flow.facts(
    figures.map((figure) => [figure.label, written(figure.left, figure, figure.leftOf)] as const),
    230,
  );
}

/** The sheet beside another one: number against number, and what was moved with what it did. */
export function comparisonPages(flow: Flow, sheet: ReportSheet, other: ReportSheet): void {
  flow.heading('Comparison');
  flow.paragraph(`On the left ${sheetName(other)}; on the right this sheet, ${sheetName(sheet)}.`);
  const sameQuestion = sheet.snapshot.mapSettings.measure === other.snapshot.mapSettings.measure;
  if (!sameQuestion)
    flow.paragraph('The two sheets show maps of different measures; floor areas are of one line each.');
  const { measure } = sheet.snapshot.mapSettings;
  flow.table(
    [
      { title: '', share: 3 },
      { title: sheetName(other), share: 1.5, figures: true },
      { title: sheetName(sheet), share: 1.5, figures: true },
      { title: 'Change', share: 1.2, figures: true },
      { title: '', share: 0.8 },
    ],
    comparedFigures(other.figures, sheet.figures, measure, sheet.threshold).map((figure): FlowCell[] => {
      const change = changeOf(figure);
      const verdict = verdictOf(figure);
      return [
        figure.label,
        written(figure.left, figure, figure.leftOf),
        written(figure.right, figure, figure.rightOf),
        change === null || change === 0 ? '–' : `${change > 0 ? '+' : ''}${written(change, figure)}`,
        { text: verdict === 'none' ? '' : verdict, colour: verdict === 'better' ? green : red, face: 'sans-bold' },
      ];
    }),
  );
  movedTable(flow, sheet, other);
}

function movedTable(flow: Flow, sheet: ReportSheet, other: ReportSheet): void {
  const matched = matchItems(other.snapshot.items, sheet.snapshot.items);
  const differences = itemDifferences(matched);
  if (differences.length === 0) {
    flow.paragraph('Nothing stands or is turned differently.', { colour: inkSoft });
    return;
  }
  const changes = pointChanges(matched, other.verdicts, sheet.verdicts);
  flow.table(
    [
      { title: 'Moved between the two', share: 2 },
      { title: 'Change', share: 2 },
      { title: 'What it may have done', share: 3 },
    ],
    differences.map((difference): FlowCell[] => {
      const effects = effectsOf(difference, changes);
      const direction = effects.some((effect) => effect.direction === 'worse')
        ? red
        : effects.some((effect) => effect.direction === 'better')
          ? green
          : inkSoft;
      return [
        difference.what,
        difference.change,
        { text: effects.map(({ words }) => words).join('; '), colour: direction },
      ];
    }),
  );
}
