import { CAUTIONS } from '@/lib/layout/protective/cautions';
import { protectiveDistance } from '@/lib/layout/protective/protective-distance';
import type { ReportSheet } from '../report-sheet';
import type { Flow } from './flow';

/** The distance of every protective device with its caution. A figure that is not known is asked for, never guessed. */
export function protectivePages(flow: Flow, { snapshot }: ReportSheet): void {
  const devices = snapshot.items.flatMap((item) => (item.kind === 'protectiveDevice' ? [item] : []));
  if (devices.length === 0) return;
  flow.heading('Protective distances');
  for (const caution of CAUTIONS) flow.caution(caution);
  for (const device of devices) {
    const answer = protectiveDistance(device);
    flow.need(70);
    flow.paragraph(device.name, { face: 'sans-bold' });
    if (!answer.told) {
      flow.facts([
        ['Distance', 'not told: figures are missing'],
        ...answer.questions.map(({ words }): [string, string] => ['To find out', words]),
        ['Source', answer.source],
      ]);
      continue;
    }
    flow.facts([
      ['Distance, planning aid', `${Math.ceil(answer.distanceMm)} mm`],
      ['From', `K = ${answer.speedMmS} mm/s, T = ${answer.timeS.toFixed(3)} s`],
      ...answer.terms.map(({ words, valueMm }): [string, string] => [words, `${Math.round(valueMm)} mm`]),
      ...answer.open.map((words): [string, string] => ['Left open', words]),
      ['Source', answer.source],
    ]);
    flow.caution('Needs a risk assessment, measured stopping times, local codes and competent persons.');
  }
}
