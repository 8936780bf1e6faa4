import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { ArmContent } from '@/lib/contracts/arms';
import { checkDraft } from './check';
import { draftOf, draftText, emptyDraft, type ArmDraft } from './draft';
import { addJoint, fillRamps, moveJoint, removeJoint, setCell, setFrame, setKind } from './edits';
import { cellAfter, isBlock, pasteBlock } from './grid';
import { readKeptDraft, writeKeptDraft } from './kept';

const contentOf = (slug: string): ArmContent => {
  const { name, description, payloadKg, arm } = BUILT_IN_ARMS.find((each) => each.slug === slug)!;
  return { name, description, payloadKg, definition: structuredClone(arm) as ArmContent['definition'] };
};
const sixAxis = (): ArmDraft => draftOf(contentOf('six-axis-12kg'));
const messagesOf = (draft: ArmDraft): string[] => checkDraft(draft).problems.map(({ message }) => message);

/** Two links whose forearm is held to the floor by the second actuator. */
const coupled = (): ArmDraft => {
  const { joints } = contentOf('six-axis-12kg').definition;
  const driven = { min: -1, max: 1, maxSpeed: 2, maxAcceleration: 3 };
  return draftOf({
    ...contentOf('six-axis-12kg'),
    definition: {
      convention: 'standard',
      joints: joints.slice(0, 2),
      coupling: [
        [1, 0],
        [-1, 1],
      ],
      actuators: [driven, { ...driven, maxSpeed: 4 }],
    },
  });
};

describe('a draft of an arm', () => {
  it('gives back the very same arm while nobody touches it', () => {
    for (const { slug } of BUILT_IN_ARMS) expect(checkDraft(draftOf(contentOf(slug))).content).toEqual(contentOf(slug));
  });

  it('keeps the digits that are not shown of what stays untouched', () => {
    const content = contentOf('six-axis-12kg');
    content.definition.joints[1].a = 0.6200004321;
    const draft = setCell(draftOf(content), 'joints.0.a', '155,5');
    expect(draft.joints[1].cells.a.text).toBe('620');
    const { joints } = checkDraft(draft).content!.definition;
    expect(joints[1].a).toBe(0.6200004321);
    expect(joints[0].a).toBe(0.1555);
  });

  it('says in words what is wrong, beside the cell, one sentence each', () => {
    const swapped = setCell(setCell(sixAxis(), 'joints.2.min', '95'), 'joints.2.max', '75');
    expect(checkDraft(swapped)).toMatchObject({
      content: null,
      problems: [
        {
          paths: ['joints.2.min'],
          message: 'Joint 3 starts at 95° and ends at 75°. The start must be below the end.',
        },
      ],
    });
    expect(messagesOf(setCell(sixAxis(), 'joints.3.maxSpeed', '0'))).toEqual([
      'Joint 4, speed: A joint needs a speed above zero.',
    ]);
    expect(messagesOf(setCell(sixAxis(), 'joints.3.a', 'wide'))).toEqual(['Joint 4, a: “wide” is no number.']);
    expect(messagesOf(setCell(sixAxis(), 'joints.3.a', '1e999'))).toEqual(['Joint 4, a: “1e999” is no number.']);
    expect(messagesOf(setCell(sixAxis(), 'joints.3.a', '200000'))).toEqual(['Joint 4, a: Lengths go up to 100 m.']);
    expect(messagesOf(setCell(sixAxis(), 'name', ' '))).toEqual(['Give the arm a name.']);
    expect(messagesOf(setCell(sixAxis(), 'payloadKg', '-1'))).toEqual(['A payload cannot be below zero.']);
  });

  it('tells a missing figure and a swapped limit at the same time, but compares no limit with an empty cell', () => {
    let draft = setCell(setCell(sixAxis(), 'joints.2.min', '95'), 'joints.2.max', '75');
    draft = setCell(setCell(draft, 'joints.4.max', ''), 'joints.5.a', '');
    expect(messagesOf(draft)).toEqual([
      'Joint 5: fill in to.',
      'Joint 6: fill in a.',
      'Joint 3 starts at 95° and ends at 75°. The start must be below the end.',
    ]);
  });

  it('draws a chain that has no name or ramp yet, and none that lacks another figure', () => {
    expect(checkDraft(setCell(sixAxis(), 'name', '')).definition).not.toBeNull();
    expect(checkDraft(setCell(sixAxis(), 'joints.0.a', '')).definition).toBeNull();
    const withoutRamp = checkDraft(setCell(sixAxis(), 'joints.0.maxAcceleration', ''));
    expect(withoutRamp).toMatchObject({ content: null, problems: [{ message: 'Joint 1: fill in ramp.' }] });
    expect(withoutRamp.definition).not.toBeNull();
  });

  it('asks for everything that an empty table leaves open', () => {
    expect(messagesOf(emptyDraft())).toEqual([
      'Joint 1: fill in from, to, speed and ramp.',
      'Joint 2: fill in from, to, speed and ramp.',
      'Give the arm a name.',
    ]);
  });

  it('takes degrees for millimetres where a joint slides instead of turning', () => {
    const draft = setKind(sixAxis(), 0, 'prismatic');
    expect(draft.joints[0].cells.max).toEqual({ text: '170', value: 0.17 });
    expect(checkDraft(setKind(draft, 0, 'revolute')).content?.definition.joints[0].max).toBeCloseTo(
      (170 * Math.PI) / 180,
    );
  });

  it('adds, moves and removes joints', () => {
    const draft = sixAxis();
    const moved = moveJoint(draft, 1, 1);
    expect(moved.joints.map(({ key }) => key)).toEqual([0, 2, 1, 3, 4, 5].map((index) => draft.joints[index].key));
    expect(moveJoint(draft, 0, -1)).toBe(draft);
    expect(removeJoint(draft, 5).joints).toHaveLength(5);
    expect(messagesOf(addJoint(draft))).toEqual(['Joint 7: fill in from, to, speed and ramp.']);
    let full = draft;
    for (let count = 0; count < 10; count++) full = addJoint(full);
    expect(full.joints).toHaveLength(12);
    const one = removeJoint(removeJoint(emptyDraft(), 0), 0);
    expect(one.joints).toHaveLength(1);
  });

  it('keeps coupling and actuators in step with the joints', () => {
    const draft = coupled();
    expect(checkDraft(draft).content?.definition.coupling).toEqual([
      [1, 0],
      [-1, 1],
    ]);
    const removed = checkDraft(removeJoint(draft, 0)).content?.definition;
    expect(removed?.coupling).toEqual([[1]]);
    expect(removed?.actuators?.[0].maxSpeed).toBeCloseTo(4, 12);
    const added = addJoint(draft);
    expect(added.coupling?.map((row) => row.map(({ value }) => value))).toEqual([
      [1, 0, 0],
      [-1, 1, 0],
      [0, 0, 1],
    ]);
    expect(messagesOf(added)).toEqual([
      'Joint 3: fill in from, to, speed and ramp.',
      'Actuator 3: fill in from, to, speed and ramp.',
    ]);
    expect(messagesOf(setCell(draft, 'actuators.1.min', '300'))[0]).toMatch(/^Actuator 2 starts at 300°/);
    expect(messagesOf(setCell(draft, 'coupling.1.0', 'x'))).toEqual([
      'Coupling, joint 2, actuator 1: “x” is no number.',
    ]);
  });

  it('takes a tool transform in mm and degrees', () => {
    const draft = setCell(setCell(setFrame(sixAxis(), 'tool', true), 'tool.xyz.2', '120'), 'tool.rpy.1', '90');
    expect(checkDraft(draft).content?.definition.tool).toEqual({ xyz: [0, 0, 0.12], rpy: [0, Math.PI / 2, 0] });
    expect(messagesOf(setCell(draft, 'tool.rpy.1', ''))).toEqual(['Tool: fill in pitch.']);
    expect(checkDraft(setFrame(draft, 'tool', false)).content).toEqual(contentOf('six-axis-12kg'));
  });

  it('works ramps out from a stated time, where they are missing', () => {
    const draft = fillRamps(setCell(sixAxis(), 'joints.0.maxAcceleration', ''), 0.25);
    expect(draft.joints[0].cells.maxAcceleration.text).toBe(String(166 / 0.25));
    expect(draft.joints[1].cells.maxAcceleration.text).toBe('560');
  });

  it('comes back from its kept text as it was, with gaps and all', () => {
    const draft = setCell(sixAxis(), 'joints.0.a', '');
    const back = readKeptDraft(writeKeptDraft(draft))!;
    expect(draftText(back)).toBe(draftText(draft));
    expect(back.joints[0].cells.a.value).toBeNaN();
    expect(readKeptDraft('{"format":0}')).toBeNull();
    expect(readKeptDraft('nothing')).toBeNull();
  });

  it('survives any text in any cell', () => {
    const paths = [
      'joints.1.a',
      'joints.1.type',
      'joints.9.a',
      'tool.rpy.2',
      'coupling.1.1',
      'actuators.0.max',
      'payloadKg',
      'x.y',
    ];
    fc.assert(
      fc.property(fc.constantFrom(...paths), fc.string({ unit: 'binary' }), (path, text) => {
        const { content } = checkDraft(setCell(setFrame(coupled(), 'tool', true), path, text));
        // JSON writes NaN and what is endless as null.
        expect(JSON.stringify(content?.definition ?? {})).not.toContain('null');
      }),
      { seed: 8, numRuns: 500 },
    );
  });
});

describe('the table as a grid', () => {
  const keys = { shiftKey: false, atStart: false, atEnd: false };

  it('goes down with Enter and the arrow, up with Shift and Enter, and sideways at the ends of a text', () => {
    const draft = sixAxis();
    expect(cellAfter(draft, 'joints.0.d', { ...keys, key: 'Enter' })).toBe('joints.1.d');
    expect(cellAfter(draft, 'joints.5.d', { ...keys, key: 'ArrowDown' })).toBeNull();
    expect(cellAfter(draft, 'joints.1.d', { ...keys, key: 'Enter', shiftKey: true })).toBe('joints.0.d');
    expect(cellAfter(draft, 'joints.1.d', { ...keys, key: 'ArrowRight' })).toBeNull();
    expect(cellAfter(draft, 'joints.1.d', { ...keys, key: 'ArrowRight', atEnd: true })).toBe('joints.1.theta');
    expect(cellAfter(draft, 'joints.1.a', { ...keys, key: 'ArrowLeft', atStart: true })).toBe('joints.1.type');
    expect(cellAfter(draft, 'tool.xyz.0', { ...keys, key: 'Enter' })).toBeNull();
  });

  it('takes a block from a spreadsheet, adds the rows it needs and marks what it cannot read', () => {
    const block =
      'turns\t10\t-90\t20\t0\t-100\t100\t90\t300\tright of the table\r\nslides\t0\t0\t0\t0\t0\t250,5\t1100\tsoon\r\n';
    expect(isBlock(block)).toBe(true);
    expect(isBlock('150\n')).toBe(false);
    const draft = pasteBlock(emptyDraft(), 'joints.1.type', block);
    expect(draft.joints).toHaveLength(3);
    expect(draft.joints[1].cells.d).toEqual({ text: '20', value: 0.02 });
    expect(draft.joints[2]).toMatchObject({ type: 'prismatic', cells: { max: { text: '250,5', value: 0.2505 } } });
    expect(messagesOf(draft)).toContain('Joint 3, ramp: “soon” is no number.');
    const many = pasteBlock(sixAxis(), 'joints.5.a', Array.from({ length: 30 }, () => '1').join('\n'));
    expect(many.joints).toHaveLength(12);
  });
});
