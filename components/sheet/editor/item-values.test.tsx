import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { newBlock, newTaskPoint } from '@/lib/editor/make-items';
import { contentOf } from '@/lib/editor/saved-fixtures';
import type { Conveyor, Fixture, GuardLine } from '@/lib/layout/items';
import { api, withApi } from '@/tests/components/api';
import { fakeId } from '@/tests/components/fakes';
import { show } from '@/tests/components/show';
import SheetEditor from './sheet-editor';
import { SheetServer } from './testing/sheet-server';

// jsdom has no canvas; what is drawn is looked at in Chromium.
vi.mock('react-konva', () => ({
  Stage: () => null,
  Layer: () => null,
  Shape: () => null,
  Image: () => null,
  Group: () => null,
}));
vi.mock('next/navigation', () => ({ useRouter: () => ({ push: vi.fn() }) }));

withApi();

let server: SheetServer;
const bare = newBlock(new Map(), 'fixture', { id: fakeId(10), xMm: 1000, yMm: 2000 }) as Fixture;
const tray: Fixture = { ...bare, name: 'Infeed tray', taskPoints: [newTaskPoint(bare, fakeId(12), [50, 0])] };

beforeEach(() => {
  localStorage.clear();
  sessionStorage.clear();
  window.matchMedia = (query) =>
    ({
      matches: false,
      media: query,
      addEventListener: () => {},
      removeEventListener: () => {},
    }) as unknown as MediaQueryList;
  server = new SheetServer();
  server.put(tray);
  server.listen();
});

async function open() {
  const { user } = show(<SheetEditor projectId={server.projectId} layoutId={server.layoutId} />, 'planner');
  await screen.findByRole('button', { name: /^Infeed tray/ });
  return {
    user,
    /** By keyboard a row of the palette places its thing at once. */
    async place(label: string) {
      screen.getByRole('button', { name: label }).focus();
      await user.keyboard('{Enter}');
    },
    async set(label: string, words: string) {
      const field = screen.getByLabelText(label);
      await user.clear(field);
      await user.type(field, `${words}{Enter}`);
      return field;
    },
  };
}
const saved = () =>
  waitFor(() => expect(document.querySelector('[data-save-state]')?.textContent).toBe('Draft, saved'));
// What was refused before stays written at its field; the newest is the last one down the panel.
const alert = () => screen.getAllByRole('alert').at(-1)?.textContent;

describe('the values of an item', () => {
  it('of a conveyor: its speed is kept, a width of zero and a carrying height below its underside are refused', async () => {
    const { place, set, user } = await open();
    await place('Conveyor');
    await set('Speed, 0 where not known', '180');
    const width = await set('Width', '0');
    expect(alert()).toBe('A conveyor has a width above zero.');
    await user.tab();
    expect(width).toHaveValue('600');
    await set('Carrying height', '500');
    expect(alert()).toMatch(/top must be above the bottom/);
    await user.tab();
    await saved();
    expect(server.named('Conveyor 1') as Conveyor).toMatchObject({ speedMmS: 180, widthMm: 600, zToMm: 850 });
  });

  it('of a note and a section line: no words and two letters are refused', async () => {
    const { place, set, user } = await open();
    await place('Note');
    const words = screen.getByLabelText('Words of the note');
    await user.clear(words);
    await user.tab();
    expect(alert()).toBe('Write the words of the note.');
    expect(words).toHaveValue('Write the note here');
    await user.clear(words);
    await user.type(words, 'Mind the step{Enter}at column B3{Control>}{Enter}{/Control}');
    await place('Section line');
    await set('Letter', 'AB');
    expect(alert()).toMatch(/one letter from A to Z/);
    await user.tab();
    await set('Letter', 'd');
    await saved();
    expect(server.named('Note 1')).toMatchObject({ text: 'Mind the step\nat column B3' });
    expect(server.named('Section A–A')).toMatchObject({ letter: 'D' });
  });

  it('of a door: it may neither overlap another one nor end beyond the line', async () => {
    const { place, user } = await open();
    await place('Guard line');
    const add = screen.getByRole('button', { name: 'Add a door' });
    await user.click(add);
    await user.click(add);
    const [, second] = screen.getAllByLabelText('From the first corner');
    await user.clear(second);
    await user.type(second, '900{Enter}');
    expect(alert()).toBe('It would overlap Door 1. Move one of the two.');
    await user.clear(second);
    await user.type(second, '1 km{Enter}');
    await user.clear(second);
    await user.type(second, '17500{Enter}');
    expect(alert()).toMatch(/18000 mm long/);
    await user.tab();
    await saved();
    expect((server.named('Guard line 1') as GuardLine).doors.map(({ alongMm }) => alongMm)).toEqual([500, 1500]);
  });

  it('of an outline: corners are added and deleted, a crossing one is refused, and it becomes a rectangle again', async () => {
    const { set, user } = await open();
    await user.click(screen.getByRole('button', { name: /^Infeed tray/ }));
    await user.click(screen.getByRole('radio', { name: 'Polygon' }));
    await user.click(screen.getByRole('button', { name: 'Add a corner after 2' }));
    await set('Corner 3, x', '800');
    const x = await set('Corner 1, x', '600');
    expect(alert()).toMatch(/Sides \d and \d of the outline cross/);
    await user.tab();
    expect(x).toHaveValue('−500');
    await user.click(screen.getByRole('button', { name: 'Delete corner 5' }));
    await user.click(screen.getByRole('button', { name: 'Delete corner 4' }));
    expect(screen.getByRole('button', { name: 'Delete corner 1' })).toBeDisabled();
    await user.click(screen.getByRole('radio', { name: 'Rectangle' }));
    expect(screen.getByLabelText('Width')).toHaveValue('1300');
    await saved();
    const { outlineMm } = server.named('Infeed tray') as Fixture;
    expect(outlineMm).toEqual([[-500, -350], [800, -350], [800, 0], [-500, 0]]); // prettier-ignore
  });

  it('keeps what lies far off the floor, and what is no number, out of the sheet', async () => {
    const { set, user } = await open();
    await user.click(screen.getByRole('button', { name: /^Infeed tray/ }));
    const x = await set('x', '2000 m');
    expect(alert()).toMatch(/farther than a sheet goes/);
    await user.tab();
    expect(x).toHaveValue('1000');
    await set('y', 'left');
    expect(alert()).toMatch(/is no length/);
    await user.tab();
    expect(server.batches).toHaveLength(0);
  });
});

describe('the fixtures of the organisation', () => {
  const kept = { id: fakeId(60), name: 'Drawer tray', content: contentOf(tray), updatedAt: '2031-05-04T08:00:00.000Z' };

  it('are placed by keyboard as copies', async () => {
    api.use(http.get('*/api/fixtures', () => HttpResponse.json({ fixtures: [kept] })));
    const { user } = await open();
    const row = await screen.findByRole('button', { name: /Own fixture.*1 in the library/ });
    row.focus();
    await user.keyboard('{Enter}');
    (await screen.findByRole('menuitem', { name: /Drawer tray/ })).focus();
    await user.keyboard('{Enter}');
    expect(await screen.findByRole('button', { name: /^Drawer tray/ })).toBeInTheDocument();
    await saved();
    const copy = server.named('Drawer tray') as Fixture;
    expect(copy.taskPoints).toHaveLength(1);
    expect(copy.taskPoints[0].id).not.toBe(tray.taskPoints[0].id);
  });

  it('take in a fixture of the sheet; a taken name is refused at the field and nothing typed is lost', async () => {
    const asked: unknown[] = [];
    api.use(
      http.post('*/api/fixtures', async ({ request }) => {
        asked.push(await request.json());
        if (asked.length > 1) return HttpResponse.json(kept, { status: 201 });
        const errors = [{ path: 'name', message: 'The library has a fixture “Drawer tray” already.' }];
        const problem = { type: 'about:blank', title: 'Invalid', status: 422, code: 'invalid', detail: 'No.' };
        return HttpResponse.json({ ...problem, requestId: 'test', errors }, { status: 422 });
      }),
    );
    const { user } = await open();
    await user.click(screen.getByRole('button', { name: /^Infeed tray/ }));
    await user.click(screen.getByRole('button', { name: 'Save to the library' }));
    const dialog = within(screen.getByRole('dialog'));
    const name = dialog.getByLabelText(/Name in the library/);
    expect(name).toHaveValue('Infeed tray');
    await user.click(dialog.getByRole('button', { name: 'Save to the library' }));
    expect(await dialog.findByText(/“Drawer tray” already/)).toBeInTheDocument();
    await user.clear(name);
    await user.type(name, 'Tray, low');
    await user.click(dialog.getByRole('button', { name: 'Save to the library' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
    expect(asked).toEqual([
      { name: 'Infeed tray', content: contentOf(tray) },
      { name: 'Tray, low', content: contentOf(tray) },
    ]);
  });

  it('say so where the library cannot be opened', async () => {
    api.use(http.get('*/api/fixtures', () => HttpResponse.error()));
    await open();
    expect(await screen.findByRole('button', { name: /Own fixture.*could not be opened/ })).toBeInTheDocument();
  });
});
