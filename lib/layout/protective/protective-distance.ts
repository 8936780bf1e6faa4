import type { ProtectiveDevice } from '../items';

/**
 * Protective distances by ISO 13855, as a planning aid. The forms and figures come from secondary sources and from memory, not
 * from the standard's text: check them against your own copy. Nothing here says that an arrangement is good enough.
 */

/** The fields that a distance is worked out from. */
export type DistanceField = 'stopS' | 'responseS' | 'detectionMm' | 'fieldHeightMm' | 'supplementMm' | 'ownAddedMm';

export interface Question {
  readonly field: DistanceField;
  /** What to find out, as it is asked at the field. */
  readonly words: string;
}

export interface DistanceTerm {
  readonly words: string;
  readonly valueMm: number;
}

export type ProtectiveDistance =
  | {
      readonly told: true;
      /** S, mm. */
      readonly distanceMm: number;
      /** K of the form that decided, mm/s, and T, s. */
      readonly speedMmS: number;
      readonly timeS: number;
      /** Everything that adds up to the distance, or lifts it. */
      readonly terms: readonly DistanceTerm[];
      readonly source: string;
      /** What the form leaves open. */
      readonly open: readonly string[];
    }
  | { readonly told: false; readonly questions: readonly Question[]; readonly source: string };

type Inputs = Pick<
  ProtectiveDevice,
  | 'form'
  | 'edition'
  | 'stopS'
  | 'responseS'
  | 'detectionMm'
  | 'fieldHeightMm'
  | 'fastMmS'
  | 'slowMmS'
  | 'reachOverMm'
  | 'supplementMm'
  | 'ownAddedMm'
>;

const QUESTIONS: Record<DistanceField, string> = {
  stopS: 'How long does the machine run on after the signal, measured at its worst load, speed and reach?',
  responseS: 'How long do the device and the control take until the signal is there? Their data sheets say it.',
  detectionMm: 'Which is the smallest body that the device notices for certain (d)? Its data sheet says it.',
  fieldHeightMm: 'How high above the floor does the field lie (H)?',
  supplementMm: 'Which supplement does your copy of the 2024 edition demand here? Enter 0 if none.',
  ownAddedMm: 'This case is not encoded. Which added distance C does your copy of the standard give?',
};

/** Above this detection capability the form at right angles is another one, which is not encoded. */
const FINE_DETECTION_MM = 40;

/** @returns the distance S, or the questions that stand open. A missing figure is never replaced by a guess. */
export function protectiveDistance(inputs: Inputs): ProtectiveDistance {
  const { form, edition, stopS, responseS, ownAddedMm } = inputs;
  const source = `ISO 13855:${edition}, ${form === 'curtain' ? 'approach at right angles' : 'approach along the field'}; from secondary sources and memory`;
  const wanted: DistanceField[] = ['stopS', 'responseS', ...fieldsOfForm(inputs)];
  const missing = wanted.filter((field) => inputs[field] === null);
  if (missing.length > 0 || stopS === null || responseS === null) {
    return { told: false, questions: missing.map((field) => ({ field, words: QUESTIONS[field] })), source };
  }
  const timeS = stopS + responseS;
  const added = addedDistance(inputs);
  const answer = form === 'curtain' ? curtain(inputs, timeS, added) : field(inputs, timeS, added);
  return { told: true, timeS, source, ...answer, open: openPoints(inputs, ownAddedMm !== null) };
}

function fieldsOfForm({ form, edition, detectionMm, ownAddedMm }: Inputs): DistanceField[] {
  const own: DistanceField[] = ownAddedMm === null ? ['ownAddedMm'] : [];
  if (edition === '2024') {
    // Of the newer edition only the parallel approach is encoded.
    return form === 'field' ? ['supplementMm'] : ['detectionMm', ...own, 'supplementMm'];
  }
  if (form === 'field') return ownAddedMm === null ? ['fieldHeightMm'] : [];
  return detectionMm !== null && detectionMm > FINE_DETECTION_MM ? ['detectionMm', ...own] : ['detectionMm'];
}

/** C and how it came about. */
function addedDistance({ form, edition, detectionMm, fieldHeightMm, ownAddedMm, reachOverMm }: Inputs): DistanceTerm {
  const through = ((): DistanceTerm => {
    if (ownAddedMm !== null) return { words: 'C as entered', valueMm: ownAddedMm };
    if (form === 'field') {
      if (edition === '2024') return { words: 'C = 1200 mm', valueMm: 1200 };
      return { words: 'C = 1200 − 0.4 H, at least 850 mm', valueMm: Math.max(850, 1200 - 0.4 * (fieldHeightMm ?? 0)) };
    }
    return { words: 'C = 8 (d − 14), at least 0', valueMm: Math.max(0, 8 * ((detectionMm ?? 0) - 14)) };
  })();
  if (form === 'field' || reachOverMm === null || reachOverMm <= through.valueMm) return through;
  return { words: 'C for reaching over, as entered', valueMm: reachOverMm };
}

type Worked = Pick<Extract<ProtectiveDistance, { told: true }>, 'distanceMm' | 'speedMmS' | 'terms'>;

/** The quick form up to 500 mm, beyond that the slow one, which then gives no less than 500 mm. */
function curtain(inputs: Inputs, timeS: number, added: DistanceTerm): Worked {
  const { fastMmS, slowMmS, detectionMm, edition, supplementMm } = inputs;
  const supplement = edition === '2024' ? (supplementMm ?? 0) : 0;
  const sum = (speedMmS: number): number => speedMmS * timeS + added.valueMm;
  const isCoarse = (detectionMm ?? 0) > FINE_DETECTION_MM;
  const quick = Math.max(100, sum(fastMmS));
  const [speedMmS, least] = isCoarse ? [slowMmS, 0] : quick > 500 ? [slowMmS, 500] : [fastMmS, 100];
  return worked(speedMmS, timeS, added, supplement, least);
}

function field({ slowMmS, edition, supplementMm }: Inputs, timeS: number, added: DistanceTerm): Worked {
  return worked(slowMmS, timeS, added, edition === '2024' ? (supplementMm ?? 0) : 0, 0);
}

function worked(speedMmS: number, timeS: number, added: DistanceTerm, supplement: number, least: number): Worked {
  const terms: DistanceTerm[] = [
    { words: `K T = ${speedMmS} mm/s × ${tidy(timeS)} s`, valueMm: speedMmS * timeS },
    added,
  ];
  if (supplement > 0) terms.push({ words: 'Supplement as entered', valueMm: supplement });
  const sum = speedMmS * timeS + added.valueMm + supplement;
  if (sum < least) terms.push({ words: `Lifted to the least of ${least} mm`, valueMm: least - sum });
  return { distanceMm: Math.max(sum, least), speedMmS, terms };
}

const tidy = (value: number): number => Number(value.toFixed(4));

function openPoints({ form, edition, reachOverMm, detectionMm }: Inputs, isOwn: boolean): string[] {
  const open: string[] = [];
  if (form === 'curtain' && reachOverMm === null)
    open.push('Reaching over is not looked at: its table is not shipped. Enter C for reaching over from your copy.');
  if (form === 'field')
    open.push('The least height of the field for its detection capability, and reaching under, are not encoded.');
  if (edition === '2024')
    open.push('Of the 2024 edition only the parallel approach is encoded; the rule of two speeds is that of 2010.');
  if (isOwn) open.push('C was entered by hand.');
  if (form === 'curtain' && (detectionMm ?? 0) > FINE_DETECTION_MM)
    open.push('Above d = 40 mm only the slow approach speed is used.');
  return open;
}
