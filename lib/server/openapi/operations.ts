import type { z } from 'zod';
import * as accounts from '@/lib/contracts/accounts';
import * as tokens from '@/lib/contracts/api-tokens';
import * as arms from '@/lib/contracts/arms';
import * as audit from '@/lib/contracts/audit';
import * as comparisons from '@/lib/contracts/comparisons';
import * as floorPlans from '@/lib/contracts/floor-plans';
import * as judging from '@/lib/contracts/judging';
import { layoutImportAnswerSchema } from '@/lib/contracts/layout-file';
import * as layouts from '@/lib/contracts/layouts';
import * as fixtures from '@/lib/contracts/library-fixtures';
import * as mails from '@/lib/contracts/mail-choices';
import { dexterityMapSchema } from '@/lib/contracts/maps';
import * as presence from '@/lib/contracts/presence';
import * as projects from '@/lib/contracts/projects';
import * as remarks from '@/lib/contracts/remarks';
import * as reports from '@/lib/contracts/reports';
import * as revisions from '@/lib/contracts/revisions';
import * as shareLinks from '@/lib/contracts/share-links';
import * as signOffs from '@/lib/contracts/sign-offs';
import { studySchema } from '@/lib/contracts/studies';

/** What the API reference says of an operation beyond what its route says itself. */
export interface Operation {
  readonly says: string;
  readonly status?: number;
  /** Schema of a JSON answer, the media type of another one, or null for an empty one. */
  readonly answer: z.ZodType | string | null;
  /** Media type of a body that is no JSON checked by the route. */
  readonly sends?: string;
}

const says = (words: string, answer: Operation['answer'], more: Partial<Operation> = {}): Operation => ({
  says: words,
  answer,
  ...more,
});
const made = { status: 201 } as const;
const empty = { status: 204 } as const;
const PICTURE = 'image/webp';
const BYTES = 'application/octet-stream';
const FORM = { sends: 'multipart/form-data', status: 201 } as const;

/** By method and folder; a test demands one for every method of every route, and none besides. */
export const OPERATIONS: Readonly<Record<string, Operation>> = {
  'GET account': says('Who you are', accounts.accountSchema),
  'GET account/mails': says('Which mails you get', mails.mailChoiceSchema),
  'PUT account/mails': says('Choose which mails you get', mails.mailChoiceSchema),
  'POST account/password-reset': says('Ask for a mail with a link for a new password', null, { status: 202 }),
  'POST account/password-reset/[token]': says('Set a new password', null, empty),
  'GET arms': says('The arm library', arms.libraryArmListSchema),
  'POST arms': says('Add an arm, from its data or as a copy', arms.libraryArmSchema, made),
  'GET arms/[armId]': says('One version of an arm', arms.libraryArmSchema),
  'PATCH arms/[armId]': says('Put an arm away or bring it back', arms.libraryArmSchema),
  'GET arms/[armId]/versions': says('All versions of an arm', arms.libraryArmListSchema),
  'POST arms/[armId]/versions': says('Save a new version of an arm', arms.libraryArmSchema, made),
  'GET audit': says('Who did what, newest first', audit.auditPageSchema),
  'GET audit/csv': says('The same as a table', 'text/csv'),
  'DELETE comparisons/[comparisonId]': says('Drop a saved comparison', null, empty),
  'GET exports/[subject]/[subjectId]/[file]': says('A sheet as a file: JSON, DXF or CSV', BYTES),
  'GET exports/schema': says('JSON Schema of the layout file', 'application/schema+json'),
  'GET fixtures': says('The fixture library', fixtures.libraryFixtureListSchema),
  'POST fixtures': says('Keep a fixture in the library', fixtures.libraryFixtureSchema, made),
  'PATCH fixtures/[fixtureId]': says('Rename a fixture of the library', fixtures.libraryFixtureSchema),
  'DELETE fixtures/[fixtureId]': says('Drop a fixture of the library', null, empty),
  'GET floor-plans/[floorPlanId]': says('A floor plan', floorPlans.floorPlanSchema),
  'PATCH floor-plans/[floorPlanId]': says('Rename a floor plan or set it to scale', floorPlans.floorPlanSchema),
  'DELETE floor-plans/[floorPlanId]': says('Delete a floor plan that nothing uses', null, empty),
  'GET floor-plans/[floorPlanId]/picture': says('Its picture, about as wide as asked', PICTURE),
  'GET invitations': says('Invitations that are open', accounts.invitationsSchema),
  'POST invitations': says('Invite somebody by e-mail', accounts.invitationSchema, made),
  'DELETE invitations/[invitationId]': says('Withdraw an invitation', null, empty),
  'GET invitations/accept/[token]': says('What an invitation offers', accounts.invitationPreviewSchema),
  'POST invitations/accept/[token]': says('Accept an invitation', null, empty),
  'GET layouts/[layoutId]': says('A draft with all that its sheet draws', layouts.layoutSchema),
  'PATCH layouts/[layoutId]': says(
    'Rename a variant, change its floor plan or its map question',
    layouts.layoutSummarySchema,
  ),
  'DELETE layouts/[layoutId]': says('Delete a variant that was never issued', null, empty),
  'GET layouts/[layoutId]/changes': says('What changed since a version', layouts.layoutChangesSchema),
  'POST layouts/[layoutId]/operations': says('Edit items, all or none', layouts.operationResultSchema),
  'POST layouts/[layoutId]/presence': says(
    'Say that you look at a sheet, and who else does',
    presence.presenceAnswerSchema,
  ),
  'GET layouts/[layoutId]/remarks': says('Remarks on all revisions of a variant', remarks.remarkListSchema),
  'GET layouts/[layoutId]/revisions': says('Revisions of a variant, newest first', revisions.revisionListSchema),
  'POST layouts/[layoutId]/revisions': says('Issue a revision', revisions.revisionSchema, made),
  'GET layouts/[layoutId]/thumbnail': says('A small picture of a variant', 'image/svg+xml'),
  'GET layouts/[layoutId]/verdicts': says('Verdicts on a draft', judging.verdictsAnswerSchema),
  'GET layouts/[layoutId]/cycle': says('Cycle estimate of a draft', judging.cycleAnswerSchema),
  'GET revisions/[revisionId]/verdicts': says('Verdicts on a revision', judging.verdictsAnswerSchema),
  'GET revisions/[revisionId]/cycle': says('Cycle estimate of a revision', judging.cycleAnswerSchema),
  'POST maps': says('Ask for a map; 202 while it is under way', dexterityMapSchema),
  'GET maps/[mapId]': says('A map and how far it has come', dexterityMapSchema),
  'POST maps/[mapId]/cancel': says('Stop a map', dexterityMapSchema),
  'POST maps/[mapId]/retry': says('Try a failed map again', dexterityMapSchema),
  'GET maps/[mapId]/tiles': says('The values of a finished map', BYTES),
  'GET members': says('Members of the organisation', accounts.membersSchema),
  'PATCH members/[memberId]': says('Change a role or what a viewer may see', accounts.memberSchema),
  'DELETE members/[memberId]': says('Remove a member', null, empty),
  'GET projects': says('Projects', projects.projectListSchema),
  'POST projects': says('Start a project', projects.projectSchema, made),
  'GET projects/[projectId]': says('A project', projects.projectSchema),
  'PATCH projects/[projectId]': says('Rename, archive or bring back a project', projects.projectSchema),
  'GET projects/[projectId]/comparisons': says('Saved comparisons', comparisons.comparisonListSchema),
  'POST projects/[projectId]/comparisons': says('Save a comparison', comparisons.comparisonSchema, made),
  'GET projects/[projectId]/floor-plans': says('Floor plans of a project', floorPlans.floorPlanListSchema),
  'POST projects/[projectId]/floor-plans': says('Upload a floor plan', floorPlans.floorPlanSchema, FORM),
  'POST projects/[projectId]/import': says('A layout file as a new variant', layoutImportAnswerSchema, {
    status: 201,
    sends: 'application/json',
  }),
  'GET projects/[projectId]/layouts': says('Variants of a project', layouts.layoutListSchema),
  'POST projects/[projectId]/layouts': says('Start a variant', layouts.layoutSummarySchema, made),
  'GET projects/[projectId]/people': says('Who can be named in a remark', remarks.peopleSchema),
  'GET projects/[projectId]/remarks': says('Remarks of a project', remarks.remarkListSchema),
  'PATCH remarks/[remarkId]': says('Settle, reopen or give a remark to somebody', remarks.remarkSchema),
  'POST remarks/[remarkId]/pictures': says('Attach a picture to your remark', remarks.remarkSchema, FORM),
  'GET remarks/[remarkId]/pictures/[pictureId]': says('A picture of a remark', PICTURE),
  'POST remarks/[remarkId]/read': says('Mark a remark as read', null, empty),
  'POST remarks/[remarkId]/replies': says('Answer a remark', remarks.remarkSchema, made),
  'GET reports': says('Reports of a sheet, newest first', reports.reportListSchema),
  'POST reports': says('Ask for a report; poll it until it is done', reports.reportSchema, { status: 202 }),
  'GET reports/[reportId]': says('A report and how far it has come', reports.reportSchema),
  'DELETE reports/[reportId]': says('Remove a report', null, empty),
  'GET reports/[reportId]/file': says('The file of a finished report', 'application/pdf'),
  'POST reports/[reportId]/retry': says('Try a failed report again', reports.reportSchema),
  'GET revisions/[revisionId]': says('An issued revision with its frozen copy', revisions.revisionSchema),
  'GET revisions/[revisionId]/remarks': says('Remarks on a revision', remarks.remarkListSchema),
  'POST revisions/[revisionId]/remarks': says('Pin a remark', remarks.remarkSchema, made),
  'POST revisions/[revisionId]/restore': says('A revision as a new draft', layouts.layoutSummarySchema, made),
  'GET revisions/[revisionId]/share-links': says('Share links of a revision', shareLinks.shareLinkListSchema),
  'POST revisions/[revisionId]/share-links': says('Make a share link', shareLinks.newShareLinkSchema, made),
  'GET revisions/[revisionId]/sign-offs': says('Who has signed a revision', signOffs.signOffStateSchema),
  'POST revisions/[revisionId]/sign-offs': says(
    'Accept a revision or ask for changes',
    signOffs.signOffStateSchema,
    made,
  ),
  'DELETE share-links/[shareLinkId]': says('Revoke a share link', shareLinks.shareLinkSchema),
  'GET share/[token]': says('The revision behind a share link', shareLinks.sharedRevisionSchema),
  'GET share/[token]/maps/[mapId]': says('A map of the shared revision', dexterityMapSchema),
  'GET share/[token]/maps/[mapId]/tiles': says('Its values', BYTES),
  'GET share/[token]/picture': says('The floor plan under the shared revision', PICTURE),
  'GET share/[token]/remarks': says('Remarks on the shared revision', remarks.remarkListSchema),
  'POST share/[token]/remarks': says('Pin a remark as a guest', remarks.remarkSchema, made),
  'POST share/[token]/remarks/[remarkId]/pictures': says('Attach a picture as a guest', remarks.remarkSchema, FORM),
  'GET share/[token]/remarks/[remarkId]/pictures/[pictureId]': says('A picture of a remark', PICTURE),
  'POST share/[token]/remarks/[remarkId]/replies': says('Answer a remark as a guest', remarks.remarkSchema, made),
  'GET share/[token]/sign-offs': says('Who has signed the shared revision', signOffs.signOffStateSchema),
  'POST share/[token]/sign-offs': says('Accept or ask for changes as a guest', signOffs.signOffStateSchema, made),
  'POST studies': says('Ask where a base could stand; 202 while it is under way', studySchema),
  'GET studies/[studyId]': says('A study and how far it has come', studySchema),
  'POST studies/[studyId]/cancel': says('Stop a study', studySchema),
  'POST studies/[studyId]/retry': says('Try a failed study again', studySchema),
  'GET tokens': says('Your API tokens', tokens.apiTokenListSchema),
  'POST tokens': says('Make an API token, with a session only', tokens.newApiTokenSchema, made),
  'DELETE tokens/[tokenId]': says('Take an API token back', tokens.apiTokenSchema),
  'GET unsubscribe/[token]': says('Which mails the holder of a link gets', mails.unsubscribeStateSchema),
  'POST unsubscribe/[token]': says('Stop the mails of a link', mails.unsubscribeStateSchema),
};
