import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { POST as uploadPlan } from '@/app/api/projects/[projectId]/floor-plans/route';
import { floorPlanSchema } from '@/lib/contracts/floor-plans';
import { askMap } from '@/lib/server/maps';
import { askStudy } from '@/lib/server/studies';
import { invitationRequestSchema } from '@/lib/contracts/accounts';
import { mapQuestionSchema } from '@/lib/contracts/maps';
import { putObject } from '@/lib/server/object-store';
import { createInvitation } from '@/lib/server/invitations/create-invitation';
import { Comparison, ProjectViewer, RemarkPicture, DexterityMap, Study } from '@/models';
import { newStudyQuestion } from './study-jobs';
import {
  createArm,
  createFinishedMap,
  createLayout,
  createLibraryFixture,
  createMember,
  createOrganisation,
  createProject,
  createRemark,
  createRevision,
  createShareLink,
  uniqueEmail,
} from '@/tests/factories';
import { upload } from './upload';

/** Stands in every name that only those who may see the project may read. */
export const SECRET = `secret-${randomUUID()}`;

export type AccessWorld = Awaited<ReturnType<typeof buildAccessWorld>>;

/** One project with everything in it, everybody around it, and a second organisation. */
export async function buildAccessWorld() {
  const organisationId = (await createOrganisation()).id;
  const projectId = (await createProject({ organisationId, name: `Project ${SECRET}` })).id;
  const otherProjectId = (await createProject({ organisationId })).id;

  const planner = await createMember('planner', { organisationId });
  const callers = {
    viewer: await createMember('viewer', { organisationId, projectIds: [projectId] }),
    otherViewer: await createMember('viewer', { organisationId, projectIds: [otherProjectId] }),
    planner,
    integrator: await createMember('integrator', { organisationId }),
    admin: await createMember('admin', { organisationId }),
    stranger: await createMember('admin'),
  };

  const addFloorPlan = async () => {
    const bytes = await sharp({ create: { width: 60, height: 40, channels: 3, background: 'white' } })
      .png()
      .toBuffer();
    const response = await upload(uploadPlan, { as: planner, projectId, file: { name: `${SECRET}.png`, bytes } });
    return floorPlanSchema.parse(await response.json());
  };
  const addLayout = () => createLayout({ projectId, createdBy: planner.user.id, name: `Variant ${SECRET}` });

  const floorPlan = await addFloorPlan();
  const arm = await createArm({ organisationId, name: `Arm ${SECRET}` });
  const map = await createFinishedMap(organisationId);
  const layout = await addLayout();
  const maps = [{ robotId: randomUUID(), mapId: map.id, key: map.key }];
  const snapshot = { projectName: `Project ${SECRET}`, floorPlan, maps };
  const revision = await createRevision({ layoutId: layout.id, issuedBy: planner.user.id, snapshot });
  const remark = await createRemark({ revisionId: revision.id, userId: callers.viewer.user.id });
  const objectKey = `remarks/${organisationId}/${randomUUID()}`;
  await putObject(objectKey, Buffer.from('picture'), 'image/webp');
  const picture = await RemarkPicture.create({ remarkId: remark.id, objectKey, widthPx: 1, heightPx: 1 });
  const { token } = await createShareLink({ revisionId: revision.id, maySign: true });

  const askNewMap = (): Promise<DexterityMap> => askMap(planner.actor, newQuestion(arm.id));
  const askNewStudy = (): Promise<Study> => askStudy(planner.actor, newStudyQuestion(arm.id));
  return {
    projectId,
    callers,
    token,
    floorPlanId: floorPlan.id,
    armId: arm.id,
    mapId: map.id,
    layoutId: layout.id,
    revisionId: revision.id,
    remarkId: remark.id,
    pictureId: picture.id,
    // What a caller may take away is made anew for each of them.
    addArm: () => createArm({ organisationId }),
    addLibraryFixture: () => createLibraryFixture({ organisationId }),
    addFloorPlan,
    addLayout,
    addShareLink: async () => (await createShareLink({ revisionId: revision.id })).shareLink,
    /** A revision that no other row can supersede, in a project of its own, and a link that may sign it. */
    addSignable: async () => {
      const { id: ownProjectId } = await createProject({ organisationId });
      const membershipId = callers.viewer.membership.id;
      await ProjectViewer.create({ projectId: ownProjectId, membershipId, organisationId });
      const { id, sha256 } = await createRevision({ layoutId: (await createLayout({ projectId: ownProjectId })).id });
      return { id, sha256, token: (await createShareLink({ revisionId: id, maySign: true })).token };
    },
    addComparison: () =>
      Comparison.create({
        projectId,
        name: `Comparison ${SECRET}`,
        sheets: [`layout:${layout.id}`, `revision:${revision.id}`],
        view: { measure: 'reach', wrist: 'held' },
      }),
    addMember: () => createMember('planner', { organisationId }),
    addInvitation: () =>
      createInvitation(
        callers.admin.actor,
        invitationRequestSchema.parse({ email: uniqueEmail(), role: 'viewer', projectIds: [projectId] }),
      ),
    addQueuedStudy: askNewStudy,
    addFailedStudy: async () => (await askNewStudy()).update({ state: 'failed', failure: 'It failed' }),
    addQueuedMap: askNewMap,
    addFailedMap: async () => (await askNewMap()).update({ state: 'failed', failure: 'It failed' }),
  };
}

let height = 100;

/** A question that nobody has asked yet. */
export function newQuestion(armId: string) {
  height += 1;
  return mapQuestionSchema.parse({
    armId,
    tool: {},
    toolHeightMm: height,
    settings: { tiltDeg: 0, towards: 'outward', rollDeg: 'free', wrist: 'held', stepMm: 200 },
  });
}
