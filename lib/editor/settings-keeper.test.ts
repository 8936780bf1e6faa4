import { beforeEach, describe, expect, it } from 'vitest';
import { mapSettingsSchema, type MapSettings } from '@/lib/layout/map-settings';
import type { SaveStatus } from './autosave';
import { SettingsKeeper, worstOf } from './settings-keeper';

const start = mapSettingsSchema.parse({});

function bench() {
  const saved: MapSettings[] = [];
  const timers: (() => void)[] = [];
  const trouble = { next: null as { passing: boolean; message: string } | null };
  const keeper = new SettingsKeeper(start, {
    save: async (settings) => {
      if (trouble.next) return trouble.next;
      saved.push(settings);
      return null;
    },
    timer: (action) => {
      timers.push(action);
      return () => void (timers.includes(action) && timers.splice(timers.indexOf(action), 1));
    },
  });
  const runTimers = async () => {
    for (const action of timers.splice(0)) action();
    await new Promise((resolve) => setImmediate(resolve));
  };
  return { keeper, saved, trouble, runTimers };
}

let at: ReturnType<typeof bench>;
beforeEach(() => (at = bench()));

describe('map settings', () => {
  it('show at once and are saved together once they rest', async () => {
    at.keeper.change({ toolHeightMm: 900 });
    at.keeper.change({ wrist: 'free' });
    expect(at.keeper.getSettings()).toMatchObject({ toolHeightMm: 900, wrist: 'free' });
    expect(at.keeper.getStatus().state).toBe('saving');
    await at.runTimers();
    expect(at.saved).toEqual([{ ...start, toolHeightMm: 900, wrist: 'free' }]);
    expect(at.keeper.getStatus().state).toBe('saved');
  });

  it('take over a colleague’s, but not before their own are in', async () => {
    at.keeper.change({ toolHeightMm: 900 });
    at.keeper.merge({ ...start, toolHeightMm: 700 });
    expect(at.keeper.getSettings().toolHeightMm).toBe(900);
    await at.runTimers();
    at.keeper.merge({ ...start, toolHeightMm: 700 });
    expect(at.keeper.getSettings().toolHeightMm).toBe(700);
  });

  it('are kept and tried again while the line is down, and given back where they are refused', async () => {
    at.trouble.next = { passing: true, message: 'No line.' };
    at.keeper.change({ toolHeightMm: 900 });
    await at.runTimers();
    expect(at.keeper.getStatus()).toEqual({ state: 'offline', detail: 'No line.' });
    at.trouble.next = null;
    await at.runTimers();
    expect(at.saved).toHaveLength(1);
    at.trouble.next = { passing: false, message: 'You may not.' };
    at.keeper.change({ toolHeightMm: 950 });
    await at.runTimers();
    expect(at.keeper.getStatus().state).toBe('refused');
    expect(at.keeper.getSettings().toolHeightMm).toBe(900);
  });
});

it('the worst state is the one that is told', () => {
  const of = (state: SaveStatus['state']) => ({ state, detail: null });
  expect(worstOf(of('saved'), of('saving')).state).toBe('saving');
  expect(worstOf(of('offline'), of('conflict')).state).toBe('conflict');
});
