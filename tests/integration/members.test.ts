import { describe, expect, it } from 'vitest';
import { GET as getAccount } from '@/app/api/account/route';
import { GET as listMembers } from '@/app/api/members/route';
import { DELETE as removeMember, PATCH as changeMember } from '@/app/api/members/[memberId]/route';
import { memberSchema, membersSchema } from '@/lib/contracts/accounts';
import { AuditEvent, Membership } from '@/models';
import { callRoute, createMember, createOrganisation, createProject } from '../factories';
import type { TestMember } from '../factories';

const change = (as: TestMember, memberId: string, body: object) =>
  callRoute(changeMember, { as, method: 'PATCH', params: { memberId }, body });
const remove = (as: TestMember, memberId: string) =>
  callRoute(removeMember, { as, method: 'DELETE', params: { memberId } });

async function team() {
  const organisationId = (await createOrganisation()).id;
  const admin = await createMember('admin', { organisationId, name: 'Ada' });
  const project = await createProject({ organisationId });
  const viewer = await createMember('viewer', { organisationId, projectIds: [project.id], name: 'Vera' });
  return { organisationId, admin, project, viewer };
}

describe('the list of members', () => {
  it('holds everybody of my organisation and nobody else', async () => {
    const { admin, viewer, project } = await team();
    await createMember('admin');
    const { members } = membersSchema.parse(await (await callRoute(listMembers, { as: admin })).json());
    expect(members.map(({ name, role, projectIds }) => ({ name, role, projectIds }))).toEqual([
      { name: 'Ada', role: 'admin', projectIds: [] },
      { name: 'Vera', role: 'viewer', projectIds: [project.id] },
    ]);
    expect(members[1]).toMatchObject({ id: viewer.membership.id, userId: viewer.user.id, email: viewer.user.email });
  });
});

describe('changing a member', () => {
  it('gives another role, which drops the limits of a viewer', async () => {
    const { admin, viewer } = await team();
    const response = await change(admin, viewer.membership.id, { role: 'planner' });
    expect(memberSchema.parse(await response.json())).toMatchObject({ role: 'planner', projectIds: [] });
    const back = memberSchema.parse(await (await change(admin, viewer.membership.id, { role: 'viewer' })).json());
    expect(back.projectIds).toEqual([]);
  });

  it('sets the projects of a viewer', async () => {
    const { admin, viewer, organisationId } = await team();
    const other = await createProject({ organisationId });
    const response = await change(admin, viewer.membership.id, { projectIds: [other.id, other.id] });
    expect(memberSchema.parse(await response.json()).projectIds).toEqual([other.id]);
  });

  it('refuses projects of another organisation, and limits for somebody who sees all', async () => {
    const { admin, viewer, project } = await team();
    const foreign = await createProject();
    expect((await change(admin, viewer.membership.id, { projectIds: [foreign.id] })).status).toBe(422);
    expect((await change(admin, admin.membership.id, { projectIds: [project.id] })).status).toBe(422);
    const { members } = membersSchema.parse(await (await callRoute(listMembers, { as: admin })).json());
    expect(members[1].projectIds).toEqual([project.id]);
  });

  it('does not reach into another organisation', async () => {
    const { viewer } = await team();
    const stranger = await createMember('admin');
    expect((await change(stranger, viewer.membership.id, { role: 'admin' })).status).toBe(404);
    expect((await remove(stranger, viewer.membership.id)).status).toBe(404);
    expect((await viewer.membership.reload()).role).toBe('viewer');
  });

  it('is written down', async () => {
    const { admin, viewer } = await team();
    await change(admin, viewer.membership.id, { role: 'planner' });
    const events = await AuditEvent.findAll({ where: { organisationId: admin.organisationId } });
    expect(events).toHaveLength(1);
    expect(events[0]).toMatchObject({
      userId: admin.user.id,
      action: 'member.changed',
      subjectId: viewer.membership.id,
      details: { from: 'viewer', to: 'planner' },
    });
  });
});

describe('removing a member', () => {
  it('puts them out with their next request', async () => {
    const { admin, viewer } = await team();
    expect((await callRoute(getAccount, { as: viewer })).status).toBe(200);
    expect((await remove(admin, viewer.membership.id)).status).toBe(204);
    expect((await callRoute(getAccount, { as: viewer })).status).toBe(401);
  });

  it('never takes the last admin, by removal or by another role', async () => {
    const { admin } = await team();
    for (const response of [
      await remove(admin, admin.membership.id),
      await change(admin, admin.membership.id, { role: 'planner' }),
    ]) {
      expect(response.status).toBe(409);
      expect(await response.json()).toMatchObject({ code: 'last_admin' });
    }
  });

  it('leaves one of two admins who remove each other at the same moment', async () => {
    const { admin, organisationId } = await team();
    const second = await createMember('admin', { organisationId });
    await Promise.all([remove(admin, second.membership.id), remove(second, admin.membership.id)]);
    expect(await Membership.count({ where: { organisationId, role: 'admin' } })).toBe(1);
  });
});
