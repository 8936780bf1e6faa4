import type { ReportInput } from '@/lib/contracts/reports';
import { PRINT_PALETTE } from '@/lib/layout/palette';
import { sheetName } from './comparison-pages';
import type { Flow } from './flow';
import { moment, STATE_NAMES } from './title-block';

/** Who has signed what, on a page of its own; only for a revision that somebody has signed. */
export function certificatePage(flow: Flow, { sheet, signatures }: ReportInput): void {
  const { revision, snapshot } = sheet;
  if (!revision || signatures.length === 0) return;
  flow.nextPage();
  flow.heading('Certificate of sign-off');
  flow.facts([
    ['Project', snapshot.projectName],
    ['Customer', snapshot.customerName],
    ['Sheet', sheetName(sheet)],
    ['Issued', `${moment(revision.issuedAt)} by ${revision.issuedBy}`],
    ['State', STATE_NAMES[revision.state]],
    ['SHA-256 of the revision', revision.sha256],
  ]);
  for (const signature of signatures) {
    flow.need(90);
    const accepted = signature.decision === 'accepted';
    flow.paragraph(accepted ? 'Accepted' : 'Changes requested', {
      face: 'sans-bold',
      size: 11,
      colour: accepted ? PRINT_PALETTE.green : PRINT_PALETTE.red,
    });
    flow.facts([
      ['By', signature.name],
      ['On', moment(signature.signedAt)],
      ['SHA-256 of what was seen', signature.sha256],
      ['Note', signature.note],
    ]);
  }
  flow.paragraph(
    'The hash is taken over everything the signer saw: items, arms, floor plan, map settings and the keys of the maps, as canonical ' +
      'JSON. Anybody who runs this installation can count it again with the command "npm run verify-revision". Sign-off is consent to ' +
      'an arrangement on paper; it is no statement about safety.',
    { colour: PRINT_PALETTE.inkSoft },
  );
}
