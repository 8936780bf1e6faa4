import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { computeMapTile } from '@/lib/kinematics/maps/compute-tile';
import { liveStepMm, makeLiveMapper } from './live-map';
import { mapRequestOf } from './map-question';
import { mapQuestionSchema } from './map-question-schema';

const question = (settings: Record<string, unknown> = {}, tool: Record<string, unknown> = {}) =>
  mapQuestionSchema.parse({
    armId: '00000000-0000-4000-8000-000000000001',
    tool: { xMm: 0, yMm: 0, zMm: 120, rollDeg: 0, pitchDeg: 0, yawDeg: 0, ...tool },
    toolHeightMm: 300,
    settings: { tiltDeg: 0, towards: 'outward', rollDeg: 'free', wrist: 'held', stepMm: 25, ...settings },
  });
const armOf = (slug: string) => BUILT_IN_ARMS.find((arm) => arm.slug === slug)!.arm;

/** A clock that says each map took so many ms. */
function clock(tookMs: () => number) {
  let at = 0;
  let began = false;
  return () => {
    began = !began;
    if (!began) at += tookMs();
    return at;
  };
}

describe('the live map', () => {
  it('is the stored map itself where symmetry makes that quick enough', () => {
    const arm = armOf('six-axis-12kg');
    const live = makeLiveMapper(clock(() => 3))({ question: question(), arm });
    const { arm: tooled, request } = mapRequestOf(question(), arm);
    expect(live.grid.stepMm).toBe(25);
    expect(live.tile).toEqual(computeMapTile(tooled, request, 0, request.grid.rows));
  });

  it('grows coarser while it takes too long, and finer again', () => {
    let tookMs = 400;
    const task = { question: question({ rollDeg: 0 }, { xMm: 80 }), arm: armOf('six-axis-12kg') };
    const compute = makeLiveMapper(clock(() => tookMs));
    const steps = [compute(task), compute(task)].map(({ grid }) => grid.stepMm);
    expect(steps[1]).toBeGreaterThan(steps[0]);
    tookMs = 1;
    for (let turn = 0; turn < 12; turn += 1) compute(task);
    expect(compute(task).grid.stepMm).toBeLessThan(steps[1]);
  });

  it.each(BUILT_IN_ARMS.map(({ slug, arm }) => [slug, arm] as const))('has an answer for %s', (_, arm) => {
    const { grid, tile } = makeLiveMapper(clock(() => 10))({ question: question({ coneDeg: 0 }), arm });
    expect(tile.reason).toHaveLength(grid.columns * grid.rows);
    expect(grid.columns * grid.rows).toBeLessThanOrEqual(22_000);
  });

  it('is never finer than what is asked', () => {
    expect(liveStepMm(question({ stepMm: 100 }), armOf('scara-5kg'), 1e9)).toBe(100);
    expect(liveStepMm(question({ stepMm: 5 }), armOf('six-axis-12kg'), 1e9)).toBeGreaterThan(5);
  });
});
