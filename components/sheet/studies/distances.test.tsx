import { screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { newBlock, newLine, newRobot } from '@/lib/editor/make-items';
import type { ProtectiveDevice } from '@/lib/layout/items';
import { withApi } from '@/tests/components/api';
import { fakeId } from '@/tests/components/fakes';
import { show } from '@/tests/components/show';
import SheetEditor from '@/components/sheet/editor/sheet-editor';
import { ARM, SheetServer } from '@/components/sheet/editor/testing/sheet-server';

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
const curtain = {
  ...newLine(new Map(), 'protectiveDevice', fakeId(10), [[0, 0], [0, 2000]], false), // prettier-ignore
  name: 'Door curtain',
} as ProtectiveDevice;
const robot = newRobot(new Map(), { id: fakeId(11), xMm: 4000, yMm: 1000 }, ARM.id);

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
  server.put(curtain, robot, newBlock(new Map(), 'obstacle', { id: fakeId(12), xMm: 9000, yMm: 1000 }));
  server.listen();
});

async function open() {
  const shown = show(<SheetEditor projectId={server.projectId} layoutId={server.layoutId} />, 'planner');
  await shown.user.click(await screen.findByRole('button', { name: /^Door curtain/ }));
  return shown;
}

const field = (label: string) => screen.getByLabelText<HTMLInputElement>(label);
const answer = () => document.querySelector('[data-protective]')?.getAttribute('data-protective');

describe('a protective device', () => {
  it('asks at each empty field what to find out, and assumes nothing', async () => {
    await open();
    expect(field('Machine stops within').value).toBe('');
    expect(field('Machine stops within')).toHaveAccessibleDescription(/measured at its worst load/);
    expect(field('Device and control')).toHaveAccessibleDescription(/data sheets/);
    expect(answer()).toBe('asks');
    expect(screen.getByText(/Nothing is assumed/)).toBeVisible();
  });

  it('tells the distance once every figure is there, with source and cautions, and asks again when one is emptied', async () => {
    const { user } = await open();
    await user.type(field('Machine stops within'), '0.1{Enter}');
    await user.type(field('Device and control'), '0.05{Enter}');
    await user.type(field('Detects from (d)'), '30{Enter}');
    await waitFor(() => expect(answer()).toBe('428'));
    expect(screen.getByText(/ISO 13855:2010, approach at right angles/)).toBeVisible();
    expect(document.querySelector('[data-cautions]')).toHaveTextContent(/risk assessment/);

    await user.clear(field('Machine stops within'));
    await user.type(field('Machine stops within'), '{Enter}');
    await waitFor(() => expect(answer()).toBe('asks'));
  });

  it('keeps the value before where a text cannot be read', async () => {
    const { user } = await open();
    await user.type(field('Machine stops within'), 'soon{Enter}');
    expect(field('Machine stops within')).toBeInvalid();
    expect(field('Machine stops within').value).toBe('soon');
    await user.type(field('Machine stops within'), '{Escape}');
    expect(field('Machine stops within').value).toBe('');
  });
});

describe('the panel of distances', () => {
  it('lists devices with what they still need, and lets figures be changed for the sheet', async () => {
    const { user } = await open();
    await user.click(screen.getByRole('tab', { name: /Distances/ }));
    const row = document.querySelector<HTMLElement>('[data-device="Door curtain"]')!;
    expect(within(row).getByText('3 figures missing')).toBeVisible();

    const body = screen.getByRole('textbox', { name: 'Body' });
    await user.clear(body);
    await user.type(body, '450{Enter}');
    expect(await screen.findByText('Changed for this sheet')).toBeVisible();
  });
});
