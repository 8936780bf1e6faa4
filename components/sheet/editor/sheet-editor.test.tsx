import { screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { Fixture } from '@/lib/layout/items';
import { newBlock, newRobot } from '@/lib/editor/make-items';
import { withApi } from '@/tests/components/api';
import { fakeId, fakeRemark } from '@/tests/components/fakes';
import { show } from '@/tests/components/show';
import SheetEditor from './sheet-editor';
import { ARM, SheetServer } from './testing/sheet-server';

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
const tray = {
  ...newBlock(new Map(), 'fixture', { id: fakeId(10), xMm: 1000, yMm: 2000 }),
  name: 'Infeed tray',
} as Fixture;
const robot = newRobot(new Map(), { id: fakeId(11), xMm: 3000, yMm: 2000 }, ARM.id);

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
  server.put(tray, robot);
  server.listen();
});

async function open(role: 'planner' | 'integrator' = 'planner') {
  const shown = show(<SheetEditor projectId={server.projectId} layoutId={server.layoutId} />, role);
  await screen.findByRole('button', { name: /^Infeed tray/ });
  return shown;
}

const saveState = () => document.querySelector('[data-save-state]')?.textContent;
const saved = () => waitFor(() => expect(saveState()).toBe('Draft, saved'));
const row = (name: RegExp) => screen.getByRole('button', { name });
const spoken = () => document.querySelector('[data-live-region]')?.textContent;

describe('the list as the whole route', () => {
  it('chooses, types a place, and saves it as one operation', async () => {
    const { user } = await open();
    row(/^Infeed tray/).focus();
    await user.keyboard('{Enter}');
    const x = screen.getByLabelText('x');
    await user.clear(x);
    await user.type(x, '1.5 m{Enter}');
    await saved();
    expect(server.named('Infeed tray')).toMatchObject({ xMm: 1500, yMm: 2000 });
    expect(server.batches).toHaveLength(1);
    expect(server.batches[0].operations).toHaveLength(1);
    expect(spoken()).toBe('x of Infeed tray');
  });

  it('keeps the value before where a typed one is refused, and sends nothing', async () => {
    const { user } = await open();
    await user.click(row(/^Infeed tray/));
    const top = screen.getByLabelText('Top');
    await user.clear(top);
    await user.type(top, '-5{Enter}');
    expect(screen.getByText(/top must be above the bottom/)).toBeInTheDocument();
    await user.tab();
    expect(top).toHaveValue('850');
    expect(server.batches).toHaveLength(0);
    expect(saveState()).toBe('Draft, saved');
  });

  it('adds by keyboard, moves by F2, duplicates, reorders, deletes and takes it all back', async () => {
    const { user } = await open();
    screen.getByRole('button', { name: 'Obstacle' }).focus();
    await user.keyboard('{Enter}');
    expect(row(/^Obstacle 1/)).toHaveAttribute('aria-pressed', 'true');
    expect(spoken()).toBe('Place Obstacle 1');

    row(/^Obstacle 1/).focus();
    await user.keyboard('{F2}');
    await waitFor(() => expect(screen.getByLabelText('x')).toHaveFocus());

    row(/^Obstacle 1/).focus();
    await user.keyboard('{Control>}d{/Control}');
    expect(row(/^Obstacle 2/)).toBeInTheDocument();

    const names = () => [...document.querySelectorAll('[data-item-row]')].map((entry) => entry.firstChild?.textContent);
    const before = names();
    row(/^Obstacle 2/).focus();
    await user.keyboard('{Alt>}{ArrowUp}{/Alt}');
    expect(names()).toEqual([...before.slice(0, -2), before.at(-1), before.at(-2)]);

    row(/^Obstacle 2/).focus();
    await user.keyboard('{Delete}');
    expect(screen.queryByRole('button', { name: /^Obstacle 2/ })).toBeNull();
    await saved();
    expect(server.named('Obstacle 1')).toBeDefined();

    for (let steps = 0; steps < 4; steps += 1) await user.click(row(/^Undo/));
    await saved();
    expect(server.layout.items.map(({ item }) => item.name).sort()).toEqual(['Infeed tray', 'R1']);
    expect(row(/^Undo/)).toHaveAttribute('aria-disabled', 'true');
  });

  it('places a robot of a chosen arm and asks one map for two that are alike', async () => {
    const { user } = await open();
    screen.getByRole('button', { name: /^Robot/ }).focus();
    await user.keyboard('{Enter}');
    await screen.findByRole('menuitem', { name: /Six-axis 12 kg/ });
    await user.keyboard('{ArrowDown}{Enter}');
    expect(await screen.findByRole('button', { name: /^R2 · six-axis 12 kg/ })).toBeInTheDocument();
    await saved();
    await user.click(row(/^R2/));
    const angle = screen.getByLabelText('Angle');
    await user.clear(angle);
    await user.type(angle, '-90{Enter}');
    await saved();
    expect(server.named('R2')).toMatchObject({ angleDeg: -90, armId: ARM.id });
    await waitFor(() => expect(server.mapQuestions.length).toBeGreaterThan(0));
    expect(server.mapQuestions).toHaveLength(1);
  });

  it('adds a task point with its verdict, and deletes it without its fixture', async () => {
    const { user } = await open();
    await user.click(row(/^Infeed tray/));
    await user.click(
      within(screen.getByRole('region', { name: 'What is chosen' })).getByRole('button', { name: 'Add' }),
    );
    const table = await screen.findByRole('table');
    expect(within(table).getByRole('row', { name: /Infeed tray 1 R1/ })).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Delete Infeed tray 1' }));
    await saved();
    expect((server.named('Infeed tray') as Fixture).taskPoints).toEqual([]);
  });
});

describe('the state of the sheet', () => {
  it('says offline, keeps the edit over a reload, and sends it once the line is back', async () => {
    const first = await open();
    server.line = 'down';
    await first.user.click(row(/^Infeed tray/));
    await first.user.keyboard('{ArrowRight}');
    await waitFor(() => expect(saveState()).toBe('Draft, offline'));
    expect(screen.getByText(/cannot be reached/)).toBeInTheDocument();
    expect(server.named('Infeed tray')).toMatchObject({ xMm: 1000 });

    first.unmount();
    server.line = 'up';
    await open();
    await saved();
    expect(server.named('Infeed tray')).toMatchObject({ xMm: 1050 });
    expect(localStorage).toHaveLength(0);
  });

  it('shows both versions of a stale edit and takes the one that is chosen', async () => {
    const { user } = await open();
    server.faster = () => server.put({ ...tray, xMm: 400, name: 'Tray by the door' });
    await user.click(row(/^Infeed tray/));
    const y = screen.getByLabelText('y');
    await user.clear(y);
    await user.type(y, '2500{Enter}');
    await user.click(await screen.findByRole('button', { name: 'Choose' }));
    const dialog = await screen.findByRole('dialog', { name: 'Changed by two people' });
    expect(within(dialog).getByRole('row', { name: 'Name Infeed tray Tray by the door' })).toBeInTheDocument();
    expect(within(dialog).getByRole('row', { name: 'y 2500 mm 2000 mm' })).toBeInTheDocument();
    await user.click(within(dialog).getByRole('button', { name: 'Take theirs' }));
    await saved();
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(row(/^Tray by the door/)).toBeInTheDocument();
    expect(server.named('Tray by the door')).toMatchObject({ xMm: 400, yMm: 2000 });
  });

  it('takes in what a colleague changes elsewhere', async () => {
    await open();
    server.put({ ...robot, xMm: 3333 });
    await waitFor(() => expect(row(/^R1/)).toHaveTextContent('x 3333'));
    expect(saveState()).toBe('Draft, saved');
  });

  it('offers issuing to an integrator only', async () => {
    const { unmount } = await open('planner');
    expect(screen.queryByRole('button', { name: 'Issue for review' })).toBeNull();
    unmount();
    await open('integrator');
    expect(screen.getByRole('button', { name: 'Issue for review' })).toBeInTheDocument();
  });
});

describe('remarks', () => {
  it('are listed with their pins’ numbers', async () => {
    server.remarks = [fakeRemark(30, { revisionId: fakeId(31), number: 3, xMm: 10, yMm: 20 })];
    const { user } = await open();
    await user.click(await screen.findByRole('tab', { name: /^Remarks/ }));
    await user.click(await screen.findByRole('button', { name: /maintenance cart/ }));
    expect(screen.getByLabelText('Answer to remark 3')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Settle' })).toBeVisible();
  });
});

describe('another planner on the sheet', () => {
  it('is named over the sheet, and announced', async () => {
    server.others = [{ seat: fakeId(40), name: 'Ilse Varnholt', at: { xMm: 1, yMm: 2 }, itemIds: [tray.id] }];
    await open();
    expect(await screen.findByText('Ilse Varnholt is here too')).toBeVisible();
  });
});
