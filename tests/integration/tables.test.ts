import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { Layout, LayoutItem, Membership, ProjectViewer, Remark, RemarkReply, User } from '@/models';
import {
  createArm,
  createFloorPlan,
  createLayout,
  createMap,
  createMember,
  createOrganisation,
  createProject,
  createRemark,
  createRevision,
  createShareLink,
  createUser,
  robotItem,
} from '../factories';

/** What the database itself refuses, whatever the code above it does. */
describe('the tables', () => {
  it('never let an issued revision change', async () => {
    const revision = await createRevision();
    const refused = /An issued revision never changes/;
    const snapshot = { ...revision.snapshot, name: 'Another' };
    await expect(revision.update({ snapshot })).rejects.toThrow(refused);
    await revision.reload();
    await expect(revision.update({ sha256: '0'.repeat(64) })).rejects.toThrow(refused);
    await revision.reload();
    await expect(revision.update({ number: 99 })).rejects.toThrow(refused);
    await revision.reload();
    await expect(revision.update({ note: 'Another note' })).rejects.toThrow(refused);
    await revision.reload();
    expect(await revision.update({ state: 'accepted' })).toMatchObject({ state: 'accepted' });
  });

  it('keep a layout from which a revision was issued', async () => {
    const { layoutId } = await createRevision();
    await expect(Layout.destroy({ where: { id: layoutId } })).rejects.toThrow(/foreign key/);
  });

  it('never let a version of an arm change, nor two share a number', async () => {
    const arm = await createArm();
    await expect(arm.update({ name: 'Another' })).rejects.toThrow(/never changes/);
    await expect(createArm({ familyId: arm.familyId, version: 1 })).rejects.toThrow(/Validation error/);
  });

  it('refuse to let a viewer into a project of another organisation', async () => {
    const { membership, organisationId } = await createMember('viewer');
    const foreign = await createProject();
    const grant = { projectId: foreign.id, membershipId: membership.id };
    await expect(ProjectViewer.create({ ...grant, organisationId })).rejects.toThrow(/foreign key/);
    const theirs = { ...grant, organisationId: foreign.organisationId };
    await expect(ProjectViewer.create(theirs)).rejects.toThrow(/foreign key/);
  });

  it('refuse a floor plan of another project under a layout, and let a deleted one go', async () => {
    const layout = await createLayout();
    const foreign = await createFloorPlan();
    await expect(layout.update({ floorPlanId: foreign.id })).rejects.toThrow(/foreign key/);
    const own = await createFloorPlan({ projectId: layout.projectId });
    await layout.reload();
    await layout.update({ floorPlanId: own.id });
    await own.destroy();
    expect(await layout.reload()).toMatchObject({ floorPlanId: null, projectId: own.projectId });
  });

  it('let the same item id stand in two layouts, once in each', async () => {
    const item = robotItem(randomUUID());
    const layout = await createLayout({ items: [item] });
    await createLayout({ items: [item] });
    const again = { layoutId: layout.id, id: item.id, version: 1, kind: item.kind, data: item, layoutVersion: 1 };
    await expect(LayoutItem.create(again)).rejects.toThrow(/Validation error/);
  });

  it('take a person into one organisation, under an address in lower case', async () => {
    const { user } = await createMember('planner');
    const other = { organisationId: (await createOrganisation()).id, userId: user.id, role: 'admin' as const };
    await expect(Membership.create(other)).rejects.toThrow(/Validation error/);
    await expect(createUser({ email: 'Somebody@Example.com' })).rejects.toThrow(/check constraint/);
    await expect(User.update({ sessionGeneration: 0 }, { where: { id: user.id } })).rejects.toThrow(/check constraint/);
  });

  it('know the author of every remark and reply: a member, or a guest of a link', async () => {
    const { shareLink } = await createShareLink();
    const { layoutId } = await createRevision();
    const remark = await createRemark({ revisionId: shareLink.revisionId });
    const guest = { guestName: 'Vera', guestEmail: 'vera@example.com', shareLinkId: shareLink.id };
    const reply = { remarkId: remark.id, body: 'Yes', authorSide: 'customer' as const };
    await RemarkReply.create({ ...reply, ...guest });
    for (const author of [{}, { guestName: 'Vera' }, { ...guest, userId: remark.userId }]) {
      await expect(RemarkReply.create({ ...reply, ...author })).rejects.toThrow(/check constraint/);
    }
    const elsewhere = { revisionId: shareLink.revisionId, layoutId, number: 1, xMm: 0, yMm: 0, body: 'Here?' };
    const stray = Remark.create({ ...elsewhere, ...guest, authorSide: 'customer' });
    await expect(stray).rejects.toThrow(/foreign key/);
  });

  it('hold one map a question and organisation, and no finished one without its answer', async () => {
    const map = await createMap();
    const { organisationId, key, input, grid } = map;
    const { id: otherId } = await createOrganisation();
    const { DexterityMap } = await import('@/models');
    await expect(DexterityMap.create({ organisationId, key, input, grid, tileCount: 1 })).rejects.toThrow(/Validation/);
    await DexterityMap.create({ organisationId: otherId, key, input, grid, tileCount: 1 });
    await expect(map.update({ state: 'done', tilesDone: 1 })).rejects.toThrow(/check constraint/);
    await expect(map.update({ state: 'failed' })).rejects.toThrow(/check constraint/);
    await expect(map.update({ state: 'queued', tilesDone: 2 })).rejects.toThrow(/check constraint/);
  });
});
