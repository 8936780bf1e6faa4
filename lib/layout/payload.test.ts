import { describe, expect, it } from 'vitest';
import { robotSchema } from './items';
import { checkPayload } from './payload';

const load = (change: object) =>
  robotSchema.parse({
    kind: 'robot',
    id: '00000000-0000-4000-8000-000000000001',
    name: 'R1',
    armId: '00000000-0000-4000-8000-000000000002',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    ...change,
  });
const centreMm = { xMm: 0, yMm: 0, zMm: 200 };
const inertiaKgM2 = { xx: 0.01, yy: 0.02, zz: 0.005 };

describe('tool plus part', () => {
  it('stand against the payload of the arm', () => {
    const check = checkPayload(load({ tool: { massKg: 2.4 }, part: { massKg: 8 } }), 12);
    expect(check.massKg.value).toBeCloseTo(10.4, 12);
    expect(check.massKg.margin).toBeCloseTo(1.6, 12);
    expect(check.within).toBe(true);
    expect(checkPayload(load({ tool: { massKg: 2.4 }, part: { massKg: 10 } }), 12).within).toBe(false);
  });

  it('are not checked for inertia unless it is entered, and it is said so', () => {
    const check = checkPayload(load({ tool: { massKg: 2.4 }, part: { massKg: 8 } }), 12);
    expect(check.inertiaKgM2).toBeNull();
    expect(check.caution).toContain('Inertia is not checked');
    expect(check.questions.map(({ field }) => field)).toEqual(['centre']);
  });

  it('make the moment and the inertia worked out by hand', () => {
    // 4 kg at 200 mm and 2 kg at 300 mm: 9.80665 · (0.8 + 0.6) N m; 0.02 + 4 · 0.04 + 0.02 + 2 · 0.09 kg m².
    const check = checkPayload(
      load({
        tool: { massKg: 4, centreMm, inertiaKgM2 },
        part: { massKg: 2, centreMm: { ...centreMm, zMm: 300 }, inertiaKgM2 },
        wristRating: { momentNm: 20, inertiaKgM2: 0.3 },
      }),
      12,
    );
    expect(check.momentNm!.value).toBeCloseTo(9.80665 * 1.4, 10);
    expect(check.momentNm!.margin).toBeCloseTo(20 - 9.80665 * 1.4, 10);
    expect(check.inertiaKgM2!.value).toBeCloseTo(0.38, 12);
    expect(check.within).toBe(false);
    expect(check.questions).toEqual([]);
    expect(check.caution).not.toContain('not checked');
  });

  it('ask for what is missing, with nothing assumed', () => {
    const check = checkPayload(load({}), null);
    expect(check.within).toBeNull();
    // A rating alone does not make an unknown tool light enough.
    expect(checkPayload(load({}), 12)).toMatchObject({ within: null, massKg: { margin: null } });
    expect(check.questions.map(({ field }) => field)).toEqual(['payload', 'toolMass', 'part']);
    const known = { massKg: 4, centreMm, inertiaKgM2 };
    expect(checkPayload(load({ tool: known, part: known }), 12).questions.map(({ field }) => field)).toEqual([
      'rating',
    ]);
  });
});
