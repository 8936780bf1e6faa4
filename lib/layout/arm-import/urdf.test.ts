import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { compileChain, forward, makeStance } from '@/lib/kinematics/chain';
import { makeSolver } from '@/lib/kinematics/solver';
import { IMPORT_MAX_BYTES, type ImportedArm } from './imported-arm';
import { armOfUrdf, poseOfPath } from './urdf-arm';
import { readUrdf } from './urdf-file';
import { pathBetween, tipsOf, type UrdfModel } from './urdf-model';

interface JointText {
  name?: string;
  type?: string;
  parent: string;
  child: string;
  xyz?: string;
  rpy?: string;
  axis?: string;
  limit?: string;
  more?: string;
}

const LIMIT = 'lower="-2" upper="2.5" velocity="3"';

const jointXml = ({
  name,
  type = 'revolute',
  parent,
  child,
  xyz = '0 0 0',
  rpy = '0 0 0',
  axis = '0 0 1',
  limit = LIMIT,
  more = '',
}: JointText): string =>
  `<joint name="${name ?? `${parent}-${child}`}" type="${type}"><parent link="${parent}"/><child link="${child}"/>` +
  `<origin xyz="${xyz}" rpy="${rpy}"/><axis xyz="${axis}"/>${limit && `<limit ${limit} effort="10"/>`}${more}</joint>`;

function urdf(joints: JointText[], more = ''): string {
  const links = [...new Set(joints.flatMap(({ parent, child }) => [parent, child]))];
  return `<?xml version="1.0"?><robot name="trial">${links.map((link) => `<link name="${link}"><inertial/></link>`).join('')}${joints.map(jointXml).join('')}${more}</robot>`;
}

function modelOf(text: string): UrdfModel {
  const answer = readUrdf(text);
  if (!answer.ok) throw new Error(answer.refusals.map(({ message }) => message).join(' '));
  return answer.value;
}

function armOf(text: string, base?: string, tip?: string): ImportedArm {
  const model = modelOf(text);
  const answer = armOfUrdf(model, base ?? model.root, tip ?? tipsOf(model, model.root)[0].link);
  if (!answer.ok) throw new Error(answer.refusals.map(({ message }) => message).join(' '));
  return answer.value;
}

const refusedFile = (text: string): string[] => {
  const answer = readUrdf(text);
  return answer.ok ? [] : answer.refusals.map(({ where, message }) => `${where ?? ''}: ${message}`);
};

/** Shoulder offset, upright first axis, level second and third, a spherical wrist: angles rounded as people type them. */
const SIX_AXIS = urdf([
  { parent: 'base', child: 'l1', xyz: '0 0 0.45' },
  { parent: 'l1', child: 'l2', xyz: '0.15 0 0', rpy: '-1.5708 0 0' },
  { parent: 'l2', child: 'l3', xyz: '0.62 0 0' },
  { parent: 'l3', child: 'l4', xyz: '0.12 0 0', rpy: '-1.5708 0 0' },
  { parent: 'l4', child: 'l5', xyz: '0 0 0.63', rpy: '1.5708 0 0' },
  { parent: 'l5', child: 'l6', rpy: '-1.5708 0 0' },
  { parent: 'l6', child: 'flange', type: 'fixed', xyz: '0 0 0.1', limit: '' },
]);

describe('readUrdf and armOfUrdf', () => {
  it('write a six-axis chain in the rows of the library arm with the same links', () => {
    const { arm, sources, notes } = armOf(SIX_AXIS);
    const known = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
    const rows = (joints: typeof arm.joints) =>
      joints.map(({ a, alpha, d }) => [a, alpha, d].map((value) => Number(value.toFixed(9))));
    expect(rows(arm.joints)).toEqual(rows(known.joints));
    expect(arm.base).toBeUndefined();
    expect(arm.tool).toBeUndefined();
    expect(makeSolver(arm).method).toBe('spherical wrist');
    expect(sources).toEqual([
      'joint base-l1',
      'joint l1-l2',
      'joint l2-l3',
      'joint l3-l4',
      'joint l4-l5',
      'joint l5-l6',
    ]);
    expect(notes).toContainEqual(expect.stringMatching(/4 angles .* rounded right angles/));
  });

  it('take limits and speeds, ask for acceleration, and fill nothing in', () => {
    const { arm, notes } = armOf(
      urdf([
        { parent: 'a', child: 'b' },
        { parent: 'b', child: 'c', xyz: '1 0 0', limit: '' },
        { parent: 'c', child: 'd', xyz: '1 0 0', type: 'continuous', limit: 'velocity="0"' },
      ]),
    );
    expect(arm.joints[0]).toMatchObject({ min: -2, max: 2.5, maxSpeed: 3, maxAcceleration: NaN });
    expect(arm.joints[1]).toMatchObject({ min: NaN, max: NaN, maxSpeed: NaN });
    expect(arm.joints[2]).toMatchObject({ min: -2 * Math.PI, max: 2 * Math.PI, maxSpeed: NaN });
    expect(notes.join(' ')).toMatch(
      /nothing of acceleration.*No speed is given for b-c, c-d.*A limit is missing for b-c.*Endless in the file.*c-d/,
    );
  });

  it('offer the ends of all branches, the longest first, and take the one chosen', () => {
    const text = urdf([
      { parent: 'base', child: 'arm' },
      { parent: 'arm', child: 'camera', xyz: '0 0 1' },
      { parent: 'arm', child: 'elbow', xyz: '0.5 0 0' },
      { parent: 'elbow', child: 'hand', xyz: '0.4 0 0' },
      { parent: 'hand', child: 'finger', type: 'fixed', limit: '' },
    ]);
    const model = modelOf(text);
    expect(tipsOf(model, model.root)).toEqual([
      { link: 'finger', moving: 3, isEnd: true },
      { link: 'camera', moving: 2, isEnd: true },
      { link: 'hand', moving: 3, isEnd: false },
      { link: 'elbow', moving: 2, isEnd: false },
      { link: 'arm', moving: 1, isEnd: false },
    ]);
    expect(armOf(text, 'base', 'camera').arm.joints).toHaveLength(2);
    expect(armOf(text, 'elbow', 'finger').arm.joints).toHaveLength(1);
    expect(armOfUrdf(model, 'camera', 'hand')).toMatchObject({ ok: false });
  });

  it.each([
    ['nothing', '', /no <robot>|no well-formed XML/],
    ['another format', '<svg/>', /no <robot>/],
    ['broken XML', '<robot name="x">\n<link name="a">\n</robot>', /^Line 3?.*no well-formed XML/],
    [
      'an outside entity',
      '<!DOCTYPE robot [<!ENTITY x SYSTEM "file:///etc/passwd">]><robot name="&x;"/>',
      /document type/,
    ],
    [
      'entities that swell',
      '<!doctype r [<!ENTITY a "aaaa"><!ENTITY b "&a;&a;">]><robot name="&b;"/>',
      /document type/,
    ],
    ['a source with macros', '<robot xmlns:xacro="x"><xacro:macro name="y"/></robot>', /Expand it to plain URDF/],
    ['nesting without end', `<robot>${'<a>'.repeat(500)}${'</a>'.repeat(500)}</robot>`, /cannot be read as XML/],
    ['a name that is none', '<robot><__proto__ x="1"/></robot>', /cannot be read as XML/],
    ['no links', '<robot name="x"/>', /no links/],
    ['no joints', '<robot><link name="a"/></robot>', /no joints/],
    ['a link without a name', '<robot><link/></robot>', /A link has no name/],
    [
      'an unknown link',
      urdf([{ parent: 'a', child: 'b' }]).replace('<link name="b">', '<link name="c">'),
      /^Joint a-b: It names the link “b”/,
    ],
    [
      'a circle',
      urdf([
        { parent: 'a', child: 'b' },
        { parent: 'b', child: 'a' },
      ]),
      /round in a circle/,
    ],
    [
      'two parents',
      urdf([
        { parent: 'a', child: 'c' },
        { parent: 'b', child: 'c', name: 'x' },
      ]),
      /hangs on two joints/,
    ],
    [
      'two trees',
      urdf([
        { parent: 'a', child: 'b' },
        { parent: 'c', child: 'd' },
      ]),
      /“a”, “c” hang on no joint/,
    ],
    [
      'two joints of one name',
      urdf([
        { parent: 'a', child: 'b', name: 'j' },
        { parent: 'b', child: 'c', name: 'j' },
      ]),
      /Two joints have the same name/,
    ],
    ['an unknown type', urdf([{ parent: 'a', child: 'b', type: 'elastic' }]), /^Joint a-b: “elastic” is no type/],
    ['NaN', urdf([{ parent: 'a', child: 'b', xyz: '0 NaN 0' }]), /^Joint a-b, origin xyz: “NaN” is no number/],
    ['a huge number', urdf([{ parent: 'a', child: 'b', xyz: '0 1e300 0' }]), /origin xyz: “1e300”/],
    ['two numbers for three', urdf([{ parent: 'a', child: 'b', rpy: '0 0' }]), /origin rpy: Three numbers/],
    ['an axis of no length', urdf([{ parent: 'a', child: 'b', axis: '0 0 0' }]), /axis xyz: An axis needs a direction/],
    [
      'a wrong limit',
      urdf([{ parent: 'a', child: 'b', limit: 'lower="Infinity" upper="1"' }]),
      /limit lower: “Infinity” is no number/,
    ],
    ['too many bytes', ' '.repeat(IMPORT_MAX_BYTES + 1), /larger than 1 MB/],
  ])('refuse %s in words', (_case, text, words) => {
    expect(refusedFile(text)).toEqual([expect.stringMatching(words)]);
  });

  it.each([
    ['a floating joint', { type: 'floating' }, /It is floating/],
    ['a joint that follows another', { more: '<mimic joint="other" multiplier="-1"/>' }, /follows the joint other/],
  ])('refuse %s on the chain', (_case, part, words) => {
    const model = modelOf(urdf([{ parent: 'a', child: 'b', ...part }]));
    expect(armOfUrdf(model, 'a', 'b')).toMatchObject({
      ok: false,
      refusals: [{ where: 'Joint a-b', message: expect.stringMatching(words) }],
    });
  });

  it('refuse axes that miss being parallel by a hair, which would need links of a hundred metres', () => {
    const model = modelOf(
      urdf([
        { parent: 'a', child: 'b' },
        { parent: 'b', child: 'c', xyz: '0.5 0.5 0', rpy: '0.0000013 0 0' },
      ]),
    );
    expect(armOfUrdf(model, 'a', 'c')).toMatchObject({
      ok: false,
      refusals: [{ message: expect.stringMatching(/nearly parallel/) }],
    });
  });

  const number = (limit: number) =>
    fc.double({ min: -limit, max: limit, noNaN: true }).map((value) => Number(value.toFixed(4)));
  const triple = (limit: number) =>
    fc.tuple(number(limit), number(limit), number(limit)).map((values) => values.join(' '));
  const rightAngles = fc
    .array(fc.constantFrom(0, 1.5708, -1.5708, 3.1416), { minLength: 3, maxLength: 3 })
    .map((values) => values.join(' '));
  const anyJoint = fc.record({
    type: fc.constantFrom('revolute', 'revolute', 'prismatic', 'continuous', 'fixed'),
    xyz: fc.oneof(triple(1), fc.constant('0 0 0'), fc.constant('0 0 0.4')),
    rpy: fc.oneof(triple(3), rightAngles),
    axis: fc.oneof(
      fc.constantFrom('0 0 1', '0 1 0', '1 0 0', '0 0 -1'),
      triple(1).filter((text) => Math.hypot(...text.split(' ').map(Number)) > 0.1),
    ),
  });

  it('stand any chain where the file stands it (within 1e-9 m), or refuse it', () => {
    let taken = 0;
    fc.assert(
      fc.property(fc.array(anyJoint, { minLength: 1, maxLength: 9 }), fc.infiniteStream(number(2)), (parts, angles) => {
        const text = urdf(parts.map((part, index) => ({ ...part, parent: `l${index}`, child: `l${index + 1}` })));
        const model = modelOf(text);
        const answer = armOfUrdf(model, 'l0', `l${parts.length}`);
        if (!answer.ok) {
          expect(answer.refusals[0].message).toMatch(/Nothing moves|nearly parallel/);
          return;
        }
        taken += 1;
        const { arm } = answer.value;
        const chain = compileChain(arm);
        const posture = arm.joints.map(() => angles.next().value as number);
        const wanted = poseOfPath(pathBetween(model, 'l0', `l${parts.length}`)!, posture);
        const { tool } = forward(chain, posture, makeStance(chain));
        tool.forEach((value, index) => expect(Math.abs(value - wanted[index])).toBeLessThan(1e-9));
      }),
      { seed: 11, numRuns: 500 },
    );
    expect(taken).toBeGreaterThan(300);
  });

  it('answer any text without an exception', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
        readUrdf(text);
        readUrdf(`<robot name="x">${text}</robot>`);
        readUrdf(SIX_AXIS.replace('0.62', text));
        readUrdf(SIX_AXIS.replace('l3', text));
      }),
      { seed: 4, numRuns: 300 },
    );
  });
});
