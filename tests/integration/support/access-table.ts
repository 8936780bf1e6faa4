import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { createToken } from '@/lib/server/api-tokens/tokens';
import { askReport } from '@/lib/server/reports/ask-report';
import { failReport } from '@/lib/server/reports/fail-report';
import { reportOptionsSchema } from '@/lib/contracts/reports';
import { randomToken } from '@/lib/server/tokens';
import { dimensionSchema } from '@/lib/layout/items';
import { armContent, fixtureContent, unique, uniqueEmail } from '@/tests/factories';
import type { CallOptions } from '@/tests/factories';
import { newQuestion } from './access-world';
import { newStudyQuestion } from './study-jobs';
import type { AccessWorld } from './access-world';
import { uploadForm } from './upload';

/**
 * Who asks, in the order of the table's columns: nobody · the holder of a share link to a revision of the project · a viewer
 * of another project · an admin of another organisation · a viewer of the project · planner · integrator · admin.
 */
export const CALLERS = [
  'nobody',
  'linkHolder',
  'otherViewer',
  'stranger',
  'viewer',
  'planner',
  'integrator',
  'admin',
] as const;
export type Caller = (typeof CALLERS)[number];

type Prepare = (world: AccessWorld, caller: Caller) => Promise<CallOptions> | CallOptions;
export interface Row {
  method: string;
  /** Folder under app/api. */
  path: string;
  /** A status for each of CALLERS. */
  statuses: readonly number[];
  prepare: Prepare;
}

const row = (method: string, path: string, statuses: readonly number[], prepare: Prepare = () => ({})): Row => ({
  method,
  path,
  statuses,
  prepare,
});

const project: Prepare = ({ projectId }) => ({ params: { projectId } });
const floorPlan: Prepare = ({ floorPlanId }) => ({ params: { floorPlanId } });
const layout: Prepare = ({ layoutId }) => ({ params: { layoutId } });
const revision: Prepare = ({ revisionId }) => ({ params: { revisionId } });
const arm: Prepare = ({ armId }) => ({ params: { armId } });
const map: Prepare = ({ mapId }) => ({ params: { mapId } });
const withBody =
  (prepare: Prepare, body: unknown): Prepare =>
  async (world, caller) => ({ ...(await prepare(world, caller)), body });

/** Only the holder has the link's token; whatever else somebody is, another token opens nothing. */
const shared =
  (more: (world: AccessWorld) => object = () => ({}), body?: unknown): Prepare =>
  (world, caller) => ({
    params: { token: caller === 'linkHolder' ? world.token : randomToken(), ...more(world) },
    body,
  });

const guest = { name: 'Vera Guest', email: uniqueEmail() };
const remark = { xMm: 10, yMm: 20, body: 'Here?' };
const dimension = () =>
  dimensionSchema.parse({
    kind: 'dimension',
    id: randomUUID(),
    name: 'D',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    fromMm: [0, 0],
    toMm: [1, 0],
  });
const png = () =>
  sharp({ create: { width: 30, height: 20, channels: 3, background: 'white' } })
    .png()
    .toBuffer();

/** One that has failed: those under way are counted, and there are many callers. */
const report: Prepare = async ({ callers, revisionId }) => {
  const options = reportOptionsSchema.parse({});
  const { id } = await askReport(callers.integrator.actor, { subject: 'revisions', subjectId: revisionId, options });
  await failReport({ reportId: id, attempt: 1 }, 'No.');
  return { params: { reportId: id } };
};
const layoutFile = {
  format: 'elbowroom-layout',
  version: 1,
  name: 'From a file',
  mapSettings: {},
  arms: [],
  floorPlan: null,
  items: [],
};

// prettier-ignore
export const TABLE: readonly Row[] = [
  //                                                       nobody link  other stranger viewer plan. integ. admin
  row('GET',    'account',                                  [401, 401,  200,  200,     200,   200,  200,   200]),
  row('POST',   'account/password-reset',                   [202, 202,  202,  202,     202,   202,  202,   202], () => ({ body: { email: uniqueEmail() } })),
  row('POST',   'account/password-reset/[token]',           [404, 404,  404,  404,     404,   404,  404,   404], () => ({ params: { token: randomToken() }, body: { password: 'a new long password' } })),

  row('GET',    'members',                                  [401, 401,  403,  200,     403,   200,  200,   200]),
  row('PATCH',  'members/[memberId]',                       [401, 401,  403,  404,     403,   403,  403,   200], async (world) => ({ params: { memberId: (await world.addMember()).membership.id }, body: { role: 'viewer' } })),
  row('DELETE', 'members/[memberId]',                       [401, 401,  403,  404,     403,   403,  403,   204], async (world) => ({ params: { memberId: (await world.addMember()).membership.id } })),
  row('GET',    'invitations',                              [401, 401,  403,  200,     403,   403,  403,   200]),
  row('POST',   'invitations',                              [401, 401,  403,  201,     403,   403,  403,   201], () => ({ body: { email: uniqueEmail(), role: 'planner' } })),
  row('DELETE', 'invitations/[invitationId]',               [401, 401,  403,  404,     403,   403,  403,   204], async (world) => ({ params: { invitationId: (await world.addInvitation()).id } })),
  row('GET',    'invitations/accept/[token]',               [404, 404,  404,  404,     404,   404,  404,   404], () => ({ params: { token: randomToken() } })),
  row('POST',   'invitations/accept/[token]',               [404, 404,  404,  404,     404,   404,  404,   404], () => ({ params: { token: randomToken() }, body: { name: 'Nia', password: 'a new long password' } })),

  row('GET',    'arms',                                     [401, 401,  403,  200,     403,   200,  200,   200]),
  row('POST',   'arms',                                     [401, 401,  403,  201,     403,   403,  201,   201], () => ({ body: armContent() })),
  row('GET',    'arms/[armId]',                             [401, 401,  403,  404,     403,   200,  200,   200], arm),
  row('PATCH',  'arms/[armId]',                             [401, 401,  403,  404,     403,   403,  200,   200], async (world) => ({ params: { armId: (await world.addArm()).id }, body: { archived: true } })),
  row('GET',    'arms/[armId]/versions',                    [401, 401,  403,  404,     403,   200,  200,   200], arm),
  row('POST',   'arms/[armId]/versions',                    [401, 401,  403,  404,     403,   403,  201,   201], async (world) => ({ params: { armId: (await world.addArm()).id }, body: { ...armContent(), baseVersion: 1 } })),

  row('GET',    'fixtures',                                 [401, 401,  403,  200,     403,   200,  200,   200]),
  row('POST',   'fixtures',                                 [401, 401,  403,  201,     403,   201,  201,   201], () => ({ body: fixtureContent() })),
  row('PATCH',  'fixtures/[fixtureId]',                     [401, 401,  403,  404,     403,   200,  200,   200], async (world) => ({ params: { fixtureId: (await world.addLibraryFixture()).id }, body: { name: unique('Fixture') } })),
  row('DELETE', 'fixtures/[fixtureId]',                     [401, 401,  403,  404,     403,   204,  204,   204], async (world) => ({ params: { fixtureId: (await world.addLibraryFixture()).id } })),

  row('GET',    'projects',                                 [401, 401,  200,  200,     200,   200,  200,   200]),
  row('POST',   'projects',                                 [401, 401,  403,  201,     403,   201,  201,   201], () => ({ body: { name: unique('Project') } })),
  row('GET',    'projects/[projectId]',                     [401, 401,  404,  404,     200,   200,  200,   200], project),
  row('PATCH',  'projects/[projectId]',                     [401, 401,  403,  404,     403,   200,  200,   200], withBody(project, { siteName: 'Bay 4' })),
  row('GET',    'projects/[projectId]/floor-plans',         [401, 401,  403,  404,     403,   200,  200,   200], project),
  row('POST',   'projects/[projectId]/floor-plans',         [401, 401,  403,  404,     403,   201,  201,   201], async (world, caller) => ({ ...(await project(world, caller)), body: uploadForm({ file: { name: 'plan.png', bytes: await png() } }) })),
  row('GET',    'projects/[projectId]/layouts',             [401, 401,  404,  404,     200,   200,  200,   200], project),
  row('POST',   'projects/[projectId]/layouts',             [401, 401,  403,  404,     403,   201,  201,   201], withBody(project, { name: 'Variant' })),

  row('GET',    'floor-plans/[floorPlanId]',                [401, 401,  403,  404,     403,   200,  200,   200], floorPlan),
  row('PATCH',  'floor-plans/[floorPlanId]',                [401, 401,  403,  404,     403,   200,  200,   200], withBody(floorPlan, { name: 'Hall' })),
  row('DELETE', 'floor-plans/[floorPlanId]',                [401, 401,  403,  404,     403,   204,  204,   204], async (world) => ({ params: { floorPlanId: (await world.addFloorPlan()).id } })),
  // The plan under an issued revision; any other is a draft to a viewer (test below).
  row('GET',    'floor-plans/[floorPlanId]/picture',        [401, 401,  404,  404,     200,   200,  200,   200], floorPlan),

  row('GET',    'layouts/[layoutId]',                       [401, 401,  403,  404,     403,   200,  200,   200], layout),
  row('PATCH',  'layouts/[layoutId]',                       [401, 401,  403,  404,     403,   200,  200,   200], withBody(layout, { name: 'Variant' })),
  row('DELETE', 'layouts/[layoutId]',                       [401, 401,  403,  404,     403,   204,  204,   204], async (world) => ({ params: { layoutId: (await world.addLayout()).id } })),
  row('GET',    'layouts/[layoutId]/changes',               [401, 401,  403,  404,     403,   200,  200,   200], ({ layoutId }) => ({ params: { layoutId }, path: '/?since=0' })),
  row('POST',   'layouts/[layoutId]/operations',            [401, 401,  403,  404,     403,   200,  200,   200], (world) => ({ params: { layoutId: world.layoutId }, body: { id: randomUUID(), operations: [{ type: 'put', baseVersion: 0, item: dimension() }] } })),
  row('POST',   'layouts/[layoutId]/presence',              [401, 401,  403,  404,     403,   200,  200,   200], withBody(layout, { seat: randomUUID(), at: null, itemIds: [] })),
  row('GET',    'layouts/[layoutId]/thumbnail',             [401, 401,  403,  404,     403,   200,  200,   200], layout),
  row('GET',    'layouts/[layoutId]/verdicts',              [401, 401,  403,  404,     403,   200,  200,   200], layout),
  row('GET',    'layouts/[layoutId]/cycle',                 [401, 401,  403,  404,     403,   200,  200,   200], layout),
  row('GET',    'layouts/[layoutId]/remarks',               [401, 401,  404,  404,     200,   200,  200,   200], layout),
  row('GET',    'layouts/[layoutId]/revisions',             [401, 401,  404,  404,     200,   200,  200,   200], layout),
  row('POST',   'layouts/[layoutId]/revisions',             [401, 401,  403,  404,     403,   403,  201,   201], withBody(layout, {})),

  row('POST',   'maps',                                     [401, 401,  403,  404,     403,   202,  202,   202], ({ armId }) => ({ body: newQuestion(armId) })),
  // A map that an issued revision names; any other is a draft to a viewer (test below).
  row('GET',    'maps/[mapId]',                             [401, 401,  404,  404,     200,   200,  200,   200], map),
  row('GET',    'maps/[mapId]/tiles',                       [401, 401,  404,  404,     200,   200,  200,   200], map),
  row('POST',   'maps/[mapId]/cancel',                      [401, 401,  403,  404,     403,   200,  200,   200], async (world) => ({ params: { mapId: (await world.addQueuedMap()).id } })),
  row('POST',   'maps/[mapId]/retry',                       [401, 401,  403,  404,     403,   200,  200,   200], async (world) => ({ params: { mapId: (await world.addFailedMap()).id } })),

  row('POST',   'studies',                                  [401, 401,  403,  404,     403,   202,  202,   202], ({ armId }) => ({ body: newStudyQuestion(armId) })),
  row('GET',    'studies/[studyId]',                        [401, 401,  403,  404,     403,   200,  200,   200], async (world) => ({ params: { studyId: (await world.addQueuedStudy()).id } })),
  row('POST',   'studies/[studyId]/cancel',                 [401, 401,  403,  404,     403,   200,  200,   200], async (world) => ({ params: { studyId: (await world.addQueuedStudy()).id } })),
  row('POST',   'studies/[studyId]/retry',                  [401, 401,  403,  404,     403,   200,  200,   200], async (world) => ({ params: { studyId: (await world.addFailedStudy()).id } })),

  row('GET',    'revisions/[revisionId]',                   [401, 401,  404,  404,     200,   200,  200,   200], revision),
  row('GET',    'revisions/[revisionId]/verdicts',          [401, 401,  404,  404,     200,   200,  200,   200], revision),
  row('GET',    'revisions/[revisionId]/cycle',             [401, 401,  404,  404,     200,   200,  200,   200], revision),
  row('GET',    'revisions/[revisionId]/remarks',           [401, 401,  404,  404,     200,   200,  200,   200], revision),
  row('POST',   'revisions/[revisionId]/remarks',           [401, 401,  404,  404,     201,   201,  201,   201], withBody(revision, remark)),
  row('GET',    'revisions/[revisionId]/sign-offs',         [401, 401,  404,  404,     200,   200,  200,   200], revision),
  row('POST',   'revisions/[revisionId]/sign-offs',         [401, 401,  404,  403,     201,   403,  403,   403], async (world) => { const { id, sha256 } = await world.addSignable(); return { params: { revisionId: id }, body: { decision: 'accepted', sha256 } }; }),
  row('POST',   'revisions/[revisionId]/restore',           [401, 401,  403,  404,     403,   201,  201,   201], revision),
  row('GET',    'revisions/[revisionId]/share-links',       [401, 401,  403,  404,     403,   200,  200,   200], revision),
  row('POST',   'revisions/[revisionId]/share-links',       [401, 401,  403,  404,     403,   403,  201,   201], withBody(revision, {})),
  row('DELETE', 'share-links/[shareLinkId]',                [401, 401,  403,  404,     403,   403,  200,   200], async (world) => ({ params: { shareLinkId: (await world.addShareLink()).id } })),
  row('PATCH',  'remarks/[remarkId]',                       [401, 401,  403,  404,     403,   200,  200,   200], ({ remarkId }) => ({ params: { remarkId }, body: { resolved: true } })),
  row('POST',   'remarks/[remarkId]/read',                  [401, 401,  404,  404,     204,   204,  204,   204], ({ remarkId }) => ({ params: { remarkId } })),
  row('POST',   'remarks/[remarkId]/pictures',              [401, 401,  404,  404,     400,   403,  403,   403], ({ remarkId }) => ({ params: { remarkId }, body: new FormData() })),
  row('GET',    'remarks/[remarkId]/pictures/[pictureId]',  [401, 401,  404,  404,     200,   200,  200,   200], ({ remarkId, pictureId }) => ({ params: { remarkId, pictureId } })),
  row('GET',    'projects/[projectId]/remarks',             [401, 401,  404,  404,     200,   200,  200,   200], project),
  row('GET',    'projects/[projectId]/people',              [401, 401,  404,  404,     200,   200,  200,   200], project),
  row('POST',   'remarks/[remarkId]/replies',               [401, 401,  404,  404,     201,   201,  201,   201], ({ remarkId }) => ({ params: { remarkId }, body: { body: 'Yes' } })),

  row('GET',    'account/mails',                            [401, 401,  200,  200,     200,   200,  200,   200]),
  row('PUT',    'account/mails',                            [401, 401,  200,  200,     200,   200,  200,   200], () => ({ body: { choice: 'at_once' } })),
  // The token in a mail names one address; it needs no session, and no session replaces it.
  row('GET',    'unsubscribe/[token]',                      [404, 404,  404,  404,     404,   404,  404,   404], () => ({ params: { token: `${randomToken()}${randomToken()}` } })),
  row('POST',   'unsubscribe/[token]',                      [404, 404,  404,  404,     404,   404,  404,   404], () => ({ params: { token: `${randomToken()}${randomToken()}` } })),
  row('GET',    'projects/[projectId]/comparisons',         [401, 401,  404,  404,     200,   200,  200,   200], project),
  row('POST',   'projects/[projectId]/comparisons',         [401, 401,  403,  404,     403,   201,  201,   201], (world) => ({ params: { projectId: world.projectId }, body: { name: 'Two', sheets: [`layout:${world.layoutId}`, `revision:${world.revisionId}`], view: { measure: 'reach', wrist: 'held' } } })),
  row('DELETE', 'comparisons/[comparisonId]',               [401, 401,  403,  404,     403,   204,  204,   204], async (world) => ({ params: { comparisonId: (await world.addComparison()).id } })),
  row('GET',    'share/[token]',                            [404, 200,  404,  404,     404,   404,  404,   404], shared()),
  row('GET',    'share/[token]/sign-offs',                  [404, 200,  404,  404,     404,   404,  404,   404], shared()),
  row('POST',   'share/[token]/sign-offs',                  [404, 201,  404,  404,     404,   404,  404,   404], async (world, caller) => { const { sha256, token } = await world.addSignable(); return shared(undefined, { decision: 'changes_requested', sha256, guest })({ ...world, token }, caller); }),
  row('GET',    'share/[token]/picture',                    [404, 200,  404,  404,     404,   404,  404,   404], shared()),
  row('GET',    'share/[token]/maps/[mapId]',               [404, 200,  404,  404,     404,   404,  404,   404], shared(({ mapId }) => ({ mapId }))),
  row('GET',    'share/[token]/maps/[mapId]/tiles',         [404, 200,  404,  404,     404,   404,  404,   404], shared(({ mapId }) => ({ mapId }))),
  row('GET',    'share/[token]/remarks',                    [404, 200,  404,  404,     404,   404,  404,   404], shared()),
  row('POST',   'share/[token]/remarks',                    [404, 201,  404,  404,     404,   404,  404,   404], shared(undefined, { ...remark, guest })),
  row('POST',   'share/[token]/remarks/[remarkId]/pictures', [404, 403, 404,  404,     404,   404,  404,   404], async (world, caller) => ({ ...(await shared(({ remarkId }) => ({ remarkId }))(world, caller)), body: new FormData() })),
  row('GET',    'share/[token]/remarks/[remarkId]/pictures/[pictureId]', [404, 200, 404, 404, 404, 404, 404, 404], shared(({ remarkId, pictureId }) => ({ remarkId, pictureId }))),
  row('POST',   'share/[token]/remarks/[remarkId]/replies', [404, 201,  404,  404,     404,   404,  404,   404], shared(({ remarkId }) => ({ remarkId }), { body: 'Yes', guest })),
  row('GET',    'exports/schema',                           [200, 200,  200,  200,     200,   200,  200,   200]),
  // What was issued; a draft is refused to viewers (exports.test.ts).
  row('GET',    'exports/[subject]/[subjectId]/[file]',     [401, 401,  404,  404,     200,   200,  200,   200], ({ revisionId }) => ({ params: { subject: 'revisions', subjectId: revisionId, file: 'layout.dxf' } })),
  row('POST',   'projects/[projectId]/import',              [401, 401,  403,  404,     403,   201,  201,   201], withBody(project, layoutFile)),
  row('GET',    'reports',                                  [401, 401,  404,  404,     200,   200,  200,   200], ({ revisionId }) => ({ path: `/?subject=revisions&subjectId=${revisionId}` })),
  row('POST',   'reports',                                  [401, 401,  404,  404,     202,   202,  202,   202], ({ revisionId }) => ({ body: { subject: 'revisions', subjectId: revisionId } })),
  row('GET',    'reports/[reportId]',                       [401, 401,  404,  404,     200,   200,  200,   200], report),
  row('DELETE', 'reports/[reportId]',                       [401, 401,  404,  404,     403,   403,  204,   204], report),
  row('POST',   'reports/[reportId]/retry',                 [401, 401,  404,  404,     200,   200,  200,   200], report),
  // Nobody has made it yet (reports.test.ts makes some).
  row('GET',    'reports/[reportId]/file',                  [401, 401,  404,  404,     409,   409,  409,   409], report),

  row('GET',    'tokens',                                   [401, 401,  200,  200,     200,   200,  200,   200]),
  row('POST',   'tokens',                                   [401, 401,  201,  201,     201,   201,  201,   201], () => ({ body: { name: 'Nightly export', role: 'viewer' } })),
  row('DELETE', 'tokens/[tokenId]',                         [401, 401,  404,  404,     404,   200,  404,   200], async ({ callers }) => ({ params: { tokenId: (await createToken(callers.planner.actor, { name: 'Mine', role: 'viewer', readOnly: true, expiresInDays: 1 })).id } })),
  row('GET',    'audit',                                    [401, 401,  403,  200,     403,   403,  403,   200]),
  row('GET',    'audit/csv',                                [401, 401,  403,  200,     403,   403,  403,   200]),
  row('GET',    'openapi',                                  [200, 200,  200,  200,     200,   200,  200,   200]),
];
