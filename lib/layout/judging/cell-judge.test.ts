import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { Arm } from '@/lib/kinematics/types';
import { fixtureSchema, robotSchema, type Fixture, type Item, type Point3, type Robot } from '../items';
import { onlyWords } from '../verdict-words';
import { judgeCell, judgeItems, makeCellJudge } from '../verdicts';
import { pathLine } from './path-line';
import { patternPlaces } from './places';
import { worthOfVerdict } from './point-verdict';

const sixAxis = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
const id = (digit: number): string => `00000000-0000-4000-8000-${String(digit).padStart(12, '0')}`;

const robot = (change: object = {}): Robot =>
  robotSchema.parse({ kind: 'robot', id: id(1), name: 'R1', armId: id(2), xMm: 0, yMm: 0, angleDeg: 0, ...change });

const fixture = (change: object): Fixture =>
  fixtureSchema.parse({
    kind: 'fixture',
    id: id(3),
    name: 'Tray',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    outlineMm: [
      [0, 0],
      [1, 0],
      [0, 1],
    ],
    zToMm: 800,
    ...change,
  });

/** Two links of 0.5 and 0.4 m, 180 and 300 °/s: the planar arm of the check values in KINEMATICS.md. */
const planar: Arm = {
  convention: 'standard',
  freedoms: ['x', 'y'],
  joints: [
    [0.5, Math.PI],
    [0.4, (300 * Math.PI) / 180],
  ].map(([a, maxSpeed]) => ({
    type: 'revolute',
    a,
    alpha: 0,
    d: 0,
    theta: 0,
    min: -Math.PI,
    max: Math.PI,
    maxSpeed,
    maxAcceleration: 10,
  })),
};
const BENT = { xMm: 700, yMm: 400 * Math.sin(Math.PI / 3), zMm: 0 };
const corner = (dx: number, dy: number, arcVia: Point3 | null = null) => ({
  ...BENT,
  xMm: BENT.xMm + dx,
  yMm: BENT.yMm + dy,
  arcVia,
});
const path = (points: object[], change: object = {}) => ({ id: id(50), name: 'Seam', points, tiltDeg: 180, ...change });
const judgePath = (arm: Arm, seam: object, change: object = {}) =>
  judgeCell([robot(change), fixture({ taskPaths: [seam] })], () => arm, 'held').paths[0];

describe('the line of a path', () => {
  it('follows the arc of a circle, with its length and its directions', () => {
    const at = (degrees: number) => {
      const angle = (degrees * Math.PI) / 180;
      return { xMm: 300 + 100 * Math.cos(angle), yMm: 100 * Math.sin(angle), zMm: 850 };
    };
    for (const [to, via] of [
      [90, 30],
      [270, 100],
      [-90, -10],
    ]) {
      const line = pathLine(
        [
          { ...at(0), arcVia: null },
          { ...at(to), arcVia: at(via) },
        ],
        5,
      );
      // Arc length: radius times angle.
      expect(line.lengthMm).toBeCloseTo((100 * Math.abs(to) * Math.PI) / 180, 6);
      for (const {
        positionMm: [x, y],
        tangent,
      } of line.points) {
        expect(Math.hypot(x - 300, y)).toBeCloseTo(100, 8);
        expect(tangent[0] * (x - 300) + tangent[1] * y).toBeCloseTo(0, 8);
      }
    }
  });

  it('comes to rest at sharp corners only, and takes three points on a line for a line', () => {
    const straight = pathLine([corner(0, 0), corner(50, 0), corner(100, 0)], 10);
    expect(straight.rests).toEqual([0, straight.points.length - 1]);
    expect(straight.lengthMm).toBeCloseTo(100, 9);
    const bent = pathLine([corner(0, 0), corner(50, 0), corner(50, 30)], 10);
    expect(bent.rests).toHaveLength(3);
    const flat = pathLine([corner(0, 0), corner(100, 0, { ...BENT, xMm: BENT.xMm + 40 })], 10);
    expect(flat.lengthMm).toBeCloseTo(100, 9);
    expect(pathLine([corner(0, 0), corner(0, 0)], 10)).toEqual({ points: [], rests: [], lengthMm: 0 });
  });
});

describe('a path', () => {
  it.each([
    // Planar arm at (0°, 60°): along +X 1.295571, along +Y 1.570796 m/s (KINEMATICS.md).
    [[-10, 0], [10, 0], 1295.571],
    [[0, -10], [0, 10], 1570.796],
  ])('from %j to %j has the speed along it at every sample', (from, to, expected) => {
    // The elbow on one side only: the mirrored posture has other speeds.
    const oneSided = { ...planar, joints: [planar.joints[0], { ...planar.joints[1], min: 0 }] };
    const { best } = judgePath(oneSided, path([corner(from[0], from[1]), corner(to[0], to[1])], { speedMmS: 1000 }));
    expect(best).toMatchObject({ reached: true, branchKept: true, met: true });
    const middle = best!.readings.find(({ atMm }) => Math.abs(atMm - 10) < 1e-9)!;
    expect(middle.speedMmS).toBeCloseTo(expected, 2);
    expect(middle.marginMmS).toBeCloseTo(expected - 1000, 2);
    expect(best!.leastSpeedMmS).toBe(Math.min(...best!.readings.map(({ speedMmS }) => speedMmS)));
  });

  it('that wants more speed than its weakest place has says where', () => {
    const seam = path([corner(-80, 0), corner(80, 0)], { speedMmS: 1300 });
    const { best } = judgePath(planar, seam);
    expect(best).toMatchObject({ reached: true, met: false });
    expect(best!.reason).toMatch(/mm\/s along the path \d+ mm along it; 1300 mm\/s are wanted\./);
    const inside = best!.readings.filter(({ atMm }) => atMm >= best!.weakest!.fromMm && atMm <= best!.weakest!.toMm);
    expect(inside.every(({ speedMmS }) => speedMmS < 1300)).toBe(true);
    expect(inside.some(({ speedMmS }) => speedMmS === best!.leastSpeedMmS)).toBe(true);
  });

  it('that leaves the reach says how far it gets and by how much it misses', () => {
    // Stretched, the planar arm reaches 900 mm.
    const seam = path([
      { xMm: 700, yMm: 0, zMm: 0 },
      { xMm: 1000, yMm: 0, zMm: 0 },
    ]);
    const { best } = judgePath(planar, seam);
    expect(best).toMatchObject({ reached: false, met: false, band: 'out' });
    expect(best!.followedMm).toBeGreaterThan(190);
    expect(best!.followedMm).toBeLessThanOrEqual(200);
    expect(best!.reason).toMatch(/^It stops \d+ mm along: out of reach by \d mm\.$/);
  });

  it('is the same wherever robot and fixture stand together, and with a free roll too', () => {
    const points = [
      { xMm: 800, yMm: -200, zMm: 700 },
      { xMm: 800, yMm: 200, zMm: 700, arcVia: { xMm: 900, yMm: 0, zMm: 700 } },
    ];
    const seam = { id: id(50), name: 'Seam', points, tiltDeg: 20, azimuthDeg: 30 };
    const here = judgeCell([robot(), fixture({ taskPaths: [seam] })], () => sixAxis, 'held').paths[0];
    const moved = { xMm: 4000, yMm: -900, angleDeg: 130 };
    const there = judgeCell([robot(moved), fixture({ ...moved, taskPaths: [seam] })], () => sixAxis, 'held').paths[0];
    expect(here.best).toMatchObject({ reached: true, branchKept: true });
    expect(there.best!.leastSpeedMmS).toBeCloseTo(here.best!.leastSpeedMmS!, 3);
    // A half circle would be longer; this arc is of radius 250 over twice the angle whose sine is 0.8.
    expect(here.lengthMm).toBeCloseTo(250 * 2 * Math.asin(0.8), 3);
  });
});

describe('a pattern', () => {
  const pattern = {
    id: id(60),
    name: 'Pallet',
    xMm: 700,
    yMm: -300,
    zMm: 700,
    rows: 3,
    columns: 4,
    layers: 2,
    pitchXMm: 180,
    pitchYMm: 200,
    pitchZMm: 150,
    speedMmS: 300,
  };

  it('is judged at every place as a task point there would be', () => {
    const tray = fixture({ xMm: 120, yMm: 40, angleDeg: 15, taskPatterns: [pattern] });
    const { best, placeCount } = judgeCell([robot(), tray], () => sixAxis, 'held').patterns[0];
    const places = patternPlaces(tray.taskPatterns[0]);
    expect(places).toHaveLength(24);
    expect(placeCount).toBe(24);
    const points = places.map(({ place, xMm, yMm, zMm }) => ({
      id: id(100 + place),
      name: `${place}`,
      xMm,
      yMm,
      zMm,
      speedMmS: 300,
      order: place,
    }));
    const each = judgeItems(
      [robot(), { ...tray, taskPatterns: [], taskPoints: fixture({ taskPoints: points }).taskPoints }],
      () => sixAxis,
      'held',
    );
    expect(best!.bands).toEqual(each.map((verdict) => verdict.best!.band));
    expect(best!.reachedPlaces).toBe(each.filter((verdict) => verdict.best!.reached).length);
    expect(best!.metPlaces).toBe(each.filter((verdict) => verdict.best!.met).length);
    const worst = Math.min(...each.map((verdict) => worthOfVerdict(verdict.best!)));
    expect(worthOfVerdict(best!.worst.verdict)).toBe(worst);
    // The far corners are out of this arm's reach, the near ones are not.
    expect(best!.reachedPlaces).toBeGreaterThan(0);
    expect(best!.reached).toBe(false);
  });

  it('numbers its places row by row, or forth and back', () => {
    const tray = fixture({ taskPatterns: [{ ...pattern, layers: 1, rows: 2, columns: 3 }] }).taskPatterns[0];
    const columns = (numbering: 'rows' | 'snake') => patternPlaces({ ...tray, numbering }).map(({ column }) => column);
    expect(columns('rows')).toEqual([1, 2, 3, 1, 2, 3]);
    expect(columns('snake')).toEqual([1, 2, 3, 3, 2, 1]);
  });

  it('has a bounded number of places', () => {
    const many = { ...pattern, rows: 100, columns: 100 };
    expect(() => fixture({ taskPatterns: [many] })).toThrow('at most 500 places');
  });
});

describe('a robot chosen by hand', () => {
  const near = robot();
  const far = robot({ id: id(12), name: 'R2', xMm: 9000 });
  const tray = (robotId: string | null) =>
    fixture({ taskPoints: [{ id: id(70), name: 'Pick', xMm: 800, yMm: 0, zMm: 700, robotId }] });
  const judge = (robotId: string | null) => judgeItems([near, far, tray(robotId)], () => sixAxis, 'held')[0];

  it('counts, even where another would do better', () => {
    expect(judge(null)).toMatchObject({ assignment: 'best robot', best: { robotId: near.id, reached: true } });
    expect(judge(far.id)).toMatchObject({ assignment: 'by hand', best: { robotId: far.id, reached: false } });
    // Of robots that do not reach a point, the one that misses least is told.
    const away = fixture({ taskPoints: [{ id: id(70), name: 'Pick', xMm: 6500, yMm: 0, zMm: 700 }] });
    expect(judgeItems([near, far, away], () => sixAxis, 'held')[0].best).toMatchObject({
      robotId: far.id,
      reached: false,
    });
    expect(judge(id(99))).toMatchObject({ assignment: 'robot gone', best: { robotId: near.id } });
  });
});

describe('what is worth a word', () => {
  const all = [
    'elbow up, wrist plain',
    'elbow up, wrist flipped',
    'elbow down, wrist plain',
    'elbow down, wrist flipped',
  ];
  it('is a part that all branches share, where the arm has others', () => {
    expect(onlyWords(['elbow up, wrist flipped'], all)).toEqual(['Only with the wrist flipped.']);
    expect(onlyWords(['elbow down, wrist flipped', 'elbow down, wrist plain'], all)).toEqual([
      'Only with the elbow down.',
    ]);
    expect(onlyWords(all, all)).toEqual([]);
    expect(onlyWords(['elbow up, wrist plain'], all)).toEqual([]);
    expect(onlyWords(['wrist flipped'], ['wrist flipped'])).toEqual([]);
  });

  it('says that only the flipped wrist reaches a point, where joint 5 may turn to one side only', () => {
    const oneSided = (min: number, max: number): Arm => ({
      ...sixAxis,
      joints: sixAxis.joints.map((joint, index) => (index === 4 ? { ...joint, min, max } : joint)),
    });
    const tray = fixture({ taskPoints: [{ id: id(70), name: 'Pick', xMm: 800, yMm: 100, zMm: 700 }] });
    const notes = (arm: Arm) => judgeItems([robot(), tray], () => arm, 'held')[0].best!.notes.join(' ');
    expect(notes(sixAxis)).not.toContain('flipped');
    const [one, other] = [notes(oneSided(0.05, 2.1)), notes(oneSided(-2.1, -0.05))];
    expect([one, other].filter((words) => words.includes('Only with the wrist flipped.'))).toHaveLength(1);
  });
});

describe('judging again after a move', () => {
  const items: Item[] = [
    robot(),
    robot({ id: id(12), name: 'R2', xMm: 1800, angleDeg: 180 }),
    fixture({
      taskPoints: [0, 1, 2].map((k) => ({ id: id(70 + k), name: `P${k}`, xMm: 700 + 80 * k, yMm: 50 * k, zMm: 700 })),
      taskPaths: [
        {
          id: id(50),
          name: 'Seam',
          points: [
            { xMm: 700, yMm: 0, zMm: 700 },
            { xMm: 800, yMm: 0, zMm: 700 },
          ],
        },
      ],
    }),
  ];

  it('says what judging from scratch says, and keeps what did not change', () => {
    const judge = makeCellJudge();
    const before = judge(items, () => sixAxis, 'held');
    const moved = [items[0], { ...items[1], xMm: 1700 }, items[2]];
    const after = judge(moved, () => sixAxis, 'held');
    expect(after).toEqual(judgeCell(moved, () => sixAxis, 'held'));
    expect(after.points[0].robots[0]).toBe(before.points[0].robots[0]);
    expect(after.points[0].robots[1]).not.toBe(before.points[0].robots[1]);
    expect(after.paths[0].robots[0]).toBe(before.paths[0].robots[0]);
    const turned = [items[0], items[1], { ...items[2], angleDeg: 3 }];
    expect(judge(turned, () => sixAxis, 'held')).toEqual(judgeCell(turned, () => sixAxis, 'held'));
    expect(judge(turned, () => sixAxis, 'free')).toEqual(judgeCell(turned, () => sixAxis, 'free'));
  });
});
