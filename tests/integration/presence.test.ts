import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { POST } from '@/app/api/layouts/[layoutId]/presence/route';
import { presenceAnswerSchema } from '@/lib/contracts/presence';
import { Presence } from '@/models';
import { callRoute, createLayout, createMember, createProject, type TestMember } from '@/tests/factories';

let one: TestMember;
let other: TestMember;
let layoutId: string;

beforeAll(async () => {
  one = await createMember('planner');
  other = await createMember('integrator', { organisationId: one.organisationId });
  const project = await createProject({ organisationId: one.organisationId });
  layoutId = (await createLayout({ projectId: project.id })).id;
});

async function report(as: TestMember, seat: string, more: object = {}) {
  const response = await callRoute(POST, {
    as,
    method: 'POST',
    params: { layoutId },
    body: { seat, at: { xMm: 1000, yMm: 2000 }, itemIds: [], ...more },
  });
  expect(response.status).toBe(200);
  return presenceAnswerSchema.parse(await response.json());
}

describe('planners on one sheet', () => {
  it('see one another’s cursors and names, and not themselves', async () => {
    const [seatOne, seatOther, itemId] = [randomUUID(), randomUUID(), randomUUID()];
    expect((await report(one, seatOne)).others).toEqual([]);
    const answer = await report(other, seatOther, { itemIds: [itemId] });
    expect(answer.others).toMatchObject([{ seat: seatOne, at: { xMm: 1000, yMm: 2000 } }]);
    const back = await report(one, seatOne, { at: null });
    expect(back.others).toMatchObject([{ seat: seatOther, itemIds: [itemId] }]);
    expect((await report(other, seatOther)).others).toMatchObject([{ seat: seatOne, at: null }]);
  });

  it('are gone when they leave, and when nothing is heard of them', async () => {
    const [seatOne, seatOther] = [randomUUID(), randomUUID()];
    await report(one, seatOne);
    await report(other, seatOther);
    await report(one, seatOne, { leaving: true });
    const seats = (await report(other, seatOther)).others.map(({ seat }) => seat);
    expect(seats).not.toContain(seatOne);
    await Presence.update({ seenAt: new Date(Date.now() - 60_000) }, { where: { seat: seatOther } });
    const left = (await report(one, seatOne)).others.map(({ seat }) => seat);
    expect(left).not.toContain(seatOther);
  });

  it('cannot move another one’s cursor by naming the seat', async () => {
    const seat = randomUUID();
    await report(one, seat);
    await report(other, seat, { at: { xMm: 0, yMm: 0 } });
    await report(other, seat, { leaving: true });
    expect(await Presence.findOne({ where: { seat } })).toMatchObject({ userId: one.user.id, xMm: 1000 });
  });
});
