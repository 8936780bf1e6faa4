import { describe, expect, it } from 'vitest';
import type { Fixture, Item } from '@/lib/layout/items';
import { itemSchema } from '@/lib/layout/items';
import { CLIPBOARD_VERSION, copiedText, pasted, readCopied } from './clipboard';
import { grouped, ungrouped, withGroups } from './groups';
import { applyChanges } from './changes';
import { newBlock, newDimension, newRobot, newTaskPoint } from './make-items';
import { seeded } from './testing/seeded';

const random = seeded(21);
const robot = newRobot(new Map(), { id: random.id(), xMm: 100, yMm: 200 }, random.id());
const bare = newBlock(new Map(), 'fixture', { id: random.id(), xMm: 900, yMm: 0 }) as Fixture;
const fixture: Fixture = { ...bare, taskPoints: [newTaskPoint(bare, random.id(), [0, 0])] };
const ids = (items: readonly Item[]) => new Set(JSON.stringify(items).match(/[0-9a-f-]{36}/g));
const paste = (items: readonly Item[], onto: readonly Item[] = [], knowsArm = () => true) =>
  pasted(items, { items: new Map(onto.map((item) => [item.id, item])), byMm: 0, knowsArm, newId: random.id });

describe('the text on the clipboard', () => {
  it('brings back what was copied', () => {
    expect(readCopied(copiedText([robot, fixture], 'here'))).toEqual({
      kind: 'items',
      layoutId: 'here',
      items: [robot, fixture],
    });
  });

  it.each(['', 'Fixture A', '{', '{"a":1}', '[1]', '{"elbowroom":"map","version":1}'])(
    'leaves foreign text alone: %s',
    (text) => expect(readCopied(text).kind).toBe('foreign'),
  );

  it('refuses a newer version in words, whatever it holds', () => {
    const newer = JSON.stringify({ elbowroom: 'items', version: CLIPBOARD_VERSION + 1, entities: [] });
    expect(readCopied(newer)).toMatchObject({ kind: 'refused', message: expect.stringMatching(/newer version/) });
  });

  it('refuses damaged items in words', () => {
    const damaged = copiedText([{ ...robot, xMm: Number.NaN }], 'here');
    expect(readCopied(damaged)).toMatchObject({ kind: 'refused', message: expect.stringMatching(/damaged/) });
  });
});

describe('pasting', () => {
  it('gives every item and task point an id of its own and keeps free names and places', () => {
    const result = paste([robot, fixture]);
    if (!result.ok) throw new Error(result.message);
    const [one, two] = result.changes.map(({ after }) => after as Item);
    expect(one).toMatchObject({ name: robot.name, xMm: 100, yMm: 200, locked: false });
    const before = ids([robot, fixture]);
    before.delete(robot.kind === 'robot' ? robot.armId : '');
    for (const id of ids([one, two])) expect(before.has(id)).toBe(false);
    expect(itemSchema.parse(two)).toEqual(two);
  });

  it('takes the next free name where the name is taken', () => {
    const result = paste([robot], [robot]);
    expect(result.ok && result.changes[0].after?.name).toBe('R2');
  });

  it('keeps what the copies say of one another and forgets what is not there', () => {
    const [point] = fixture.taskPoints;
    const assigned: Fixture = { ...fixture, taskPoints: [{ ...point, robotId: robot.id }] };
    const together = paste([robot, assigned]);
    if (!together.ok) throw new Error(together.message);
    const [newOne, newFixture] = together.changes.map(({ after }) => after as Item);
    expect((newFixture as Fixture).taskPoints[0].robotId).toBe(newOne.id);
    const alone = paste([assigned]);
    expect(alone.ok && (alone.changes[0].after as Fixture).taskPoints[0].robotId).toBe(null);
  });

  it('refuses a robot whose arm the library lacks', () => {
    expect(paste([robot], [], () => false)).toMatchObject({ ok: false, message: expect.stringMatching(/R1/) });
  });

  it('pastes a group as a group of its own', () => {
    const groupId = random.id();
    const members = [robot, newDimension(new Map(), random.id(), [0, 0], [100, 0], 0)].map((item) => ({
      ...item,
      groupId,
    }));
    const result = paste(members, members);
    if (!result.ok) throw new Error(result.message);
    const groups = new Set(result.changes.map(({ after }) => after?.groupId));
    expect(groups.size).toBe(1);
    expect(groups.has(groupId)).toBe(false);
    expect(groups.has(undefined)).toBe(false);
  });
});

describe('groups', () => {
  it('are chosen whole, merged, and taken apart', () => {
    const start = new Map([robot, fixture].map((item) => [item.id, item as Item]));
    const one = applyChanges(start, grouped(start, [robot.id, fixture.id], random.id()));
    expect(withGroups(one, [fixture.id])).toEqual([fixture.id, robot.id]);
    const apart = applyChanges(one, ungrouped(one, [robot.id]));
    expect(withGroups(apart, [fixture.id])).toEqual([fixture.id]);
    expect(grouped(start, [robot.id], random.id())).toEqual([]);
  });
});
