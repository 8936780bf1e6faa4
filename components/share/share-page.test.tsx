import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { Remark } from '@/lib/contracts/remarks';
import { sharedRevisionSchema } from '@/lib/contracts/share-links';
import { itemSchema } from '@/lib/layout/items';
import { api, problem, withApi } from '@/tests/components/api';
import { fakeId, fakeRemark } from '@/tests/components/fakes';
import { show } from '@/tests/components/show';
import SharePage from './share-page';

// Canvas drawing is covered in Chromium; jsdom has no canvas.
vi.mock('@/components/sheet/reader/sheet-reader', () => ({ SheetReader: () => null }));
vi.mock('react-konva', () => ({ Stage: () => null, Layer: () => null, Shape: () => null, Image: () => null }));

withApi();
beforeEach(() => localStorage.clear());

const TOKEN = 'a'.repeat(43);
const BASE = `*/api/share/${TOKEN}`;
const tray = itemSchema.parse({
  kind: 'fixture',
  id: fakeId(1),
  name: 'Infeed tray',
  xMm: 1200,
  yMm: 800,
  angleDeg: 0,
  outlineMm: [
    [0, 0],
    [400, 0],
    [400, 300],
  ],
  zToMm: 800,
  taskPoints: [{ id: fakeId(2), name: 'Infeed 1', xMm: 0, yMm: 0, zMm: 850 }],
});

const shared = (mayRemark = true) =>
  sharedRevisionSchema.parse({
    organisationName: 'Brackwater Integration',
    customerName: 'Quillfen Pumps',
    mayRemark,
    maySign: true,
    newerNumber: null,
    expiresAt: '2027-01-01T00:00:00.000Z',
    revision: {
      id: fakeId(10),
      layoutId: fakeId(11),
      projectId: fakeId(12),
      number: 2,
      state: 'issued',
      note: 'Turned in.',
      sha256: '0'.repeat(64),
      issuedAt: '2026-12-01T08:00:00.000Z',
      issuedBy: 'Joren Addlestane',
      signOffs: [],
      snapshot: {
        format: 1,
        projectName: 'Pump housing line',
        customerName: 'Quillfen Pumps',
        letter: 'C',
        name: 'R2 turned in',
        layoutVersion: 4,
        items: [tray],
        arms: [],
        floorPlan: null,
        mapSettings: {},
        maps: [],
      },
    },
  });

const remark = (part: Partial<Remark> = {}): Remark =>
  fakeRemark(20, {
    number: 3,
    author: { name: 'Ilse Varnholt', side: 'integrator', you: false },
    body: 'Tray may turn.',
    ...part,
  });

function open(remarks: Remark[] = [], mayRemark = true) {
  api.use(
    http.get(BASE, () => HttpResponse.json(shared(mayRemark))),
    http.get(`${BASE}/remarks`, () => HttpResponse.json({ remarks })),
    http.get(`${BASE}/sign-offs`, () => HttpResponse.json({ state: 'issued', signOffs: [] })),
  );
  return show(<SharePage token={TOKEN} />);
}

describe('a shared revision', () => {
  it('shows what it is, its task points, its remarks and the cautions', async () => {
    open([
      remark(),
      remark({ id: fakeId(21), number: 1, resolvedAt: '2026-12-01T10:00:00.000Z', body: 'Settled one' }),
    ]);
    expect(await screen.findByRole('heading', { name: 'C · R2 turned in' })).toBeVisible();
    expect(screen.getByText('for Quillfen Pumps')).toBeVisible();
    expect(screen.getByText(/task points met/)).toHaveTextContent('0 of 1 task points met');
    expect(within(screen.getByRole('table', { name: /Task points/ })).getByText('No robot')).toBeVisible();
    expect(await screen.findByText('1 open')).toBeVisible();
    expect(screen.getByText(/risk assessment/)).toBeVisible();
    expect(screen.getByText('This revision was issued without a map.')).toBeVisible();
    const bodies = screen.getAllByRole('listitem').map((item) => item.textContent);
    expect(bodies[0]).toContain('Tray may turn.');
    expect(bodies[1]).toContain('settled');
  });

  it('takes a remark on a thing without a pointer and lists it', async () => {
    const kept: Remark[] = [];
    const { user } = open(kept);
    let sent: unknown;
    api.use(
      http.post(`${BASE}/remarks`, async ({ request }) => {
        sent = await request.json();
        kept.push(remark({ body: 'It stands in the door.', author: { name: 'Vera', side: 'customer', you: true } }));
        return HttpResponse.json(kept[0], { status: 201 });
      }),
    );
    await user.click(await screen.findByRole('combobox', { name: 'Remark on a thing' }));
    await user.click(await screen.findByRole('option', { name: 'Infeed tray' }));
    expect(await screen.findByText('x 1200 y 800 mm')).toBeVisible();
    await user.type(screen.getByLabelText('Your remark'), 'It stands in the door.');
    await user.type(screen.getByLabelText('Your name'), 'Vera');
    await user.type(screen.getByLabelText('Your e-mail address'), 'vera@quillfen.example');
    await user.click(screen.getByRole('button', { name: 'Pin the remark' }));
    expect(await screen.findByText('It stands in the door.')).toBeVisible();
    expect(screen.getByText(/^You,/)).toBeVisible();
    expect(sent).toEqual({
      xMm: 1200,
      yMm: 800,
      itemId: fakeId(1),
      body: 'It stands in the door.',
      guest: { name: 'Vera', email: 'vera@quillfen.example' },
    });
  });

  it('opens a remark, shows its answers and takes another', async () => {
    const { user } = open([
      remark({
        replies: [
          {
            id: fakeId(30),
            author: { name: 'Joren', side: 'integrator', you: false },
            body: 'We turn it.',
            mentions: [],
            createdAt: '2026-12-01T11:00:00.000Z',
          },
        ],
      }),
    ]);
    localStorage.setItem('elbowroom.guest', JSON.stringify({ name: 'Vera', email: 'vera@quillfen.example' }));
    let sent: unknown;
    api.use(
      http.post(`${BASE}/remarks/${fakeId(20)}/replies`, async ({ request }) => {
        sent = await request.json();
        return HttpResponse.json(remark(), { status: 201 });
      }),
    );
    await user.click(await screen.findByRole('button', { name: /Tray may turn/ }));
    expect(screen.getByText('We turn it.')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Settle this remark' })).not.toBeInTheDocument();
    await user.type(screen.getByLabelText('Answer to remark 3'), 'Good.');
    await user.click(screen.getByRole('button', { name: 'Send answer' }));
    await waitFor(() =>
      expect(sent).toEqual({ body: 'Good.', guest: { name: 'Vera', email: 'vera@quillfen.example' } }),
    );
  });

  it('offers nothing to write where the link does not allow it', async () => {
    const { user } = open([remark()], false);
    await user.click(await screen.findByRole('button', { name: /Tray may turn/ }));
    expect(screen.queryByRole('textbox')).not.toBeInTheDocument();
    expect(screen.queryByRole('combobox')).not.toBeInTheDocument();
  });
});

describe('signing', () => {
  it('asks a guest who they are, signs the hash that was shown, and shows the new state', async () => {
    const sent: unknown[] = [];
    const signed = {
      id: fakeId(40),
      decision: 'accepted',
      note: '',
      sha256: '0'.repeat(64),
      name: 'Vera Quill',
      email: null,
      signedAt: '2026-12-01T10:00:00.000Z',
    };
    const { user } = open();
    api.use(
      http.post(`${BASE}/sign-offs`, async ({ request }) => {
        sent.push(await request.json());
        return HttpResponse.json({ state: 'accepted', signOffs: [signed] }, { status: 201 });
      }),
    );
    await user.click(await screen.findByRole('button', { name: 'Accept revision' }));
    await user.click(screen.getByRole('button', { name: 'Sign and accept' }));
    expect(await screen.findByText('Write your name.')).toBeInTheDocument();
    expect(sent).toEqual([]);
    await user.type(screen.getByLabelText('Your name'), 'Vera Quill');
    await user.type(screen.getByLabelText('Your e-mail address'), 'Vera@quillfen.example');
    await user.click(screen.getByRole('button', { name: 'Sign and accept' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    expect(sent).toEqual([
      {
        decision: 'accepted',
        sha256: '0'.repeat(64),
        note: '',
        guest: { name: 'Vera Quill', email: 'vera@quillfen.example' },
      },
    ]);
    expect(screen.getByRole('button', { name: 'Accepted' })).toBeDisabled();
    expect(screen.getAllByText('Accepted').length).toBeGreaterThan(1);
  });

  it('keeps what was typed where the server refuses', async () => {
    const { user } = open();
    api.use(
      http.post(`${BASE}/sign-offs`, () => problem(409, 'superseded', 'A newer revision has been issued meanwhile.')),
    );
    await user.click(await screen.findByRole('button', { name: 'Ask for changes' }));
    await user.type(screen.getByLabelText('Your name'), 'Vera Quill');
    await user.type(screen.getByLabelText('Your e-mail address'), 'vera@quillfen.example');
    await user.type(screen.getByLabelText('What has to change'), 'More room behind the stand.');
    await user.click(screen.getByRole('button', { name: 'Send' }));
    expect(await screen.findByText(/newer revision has been issued/)).toBeInTheDocument();
    expect(screen.getByLabelText('What has to change')).toHaveValue('More room behind the stand.');
  });
});

describe('a link that opens nothing', () => {
  it.each([404, 422])('says whom to ask (%i)', async (status) => {
    api.use(
      http.get(BASE, () => problem(status, 'not_found', 'There is no such link.')),
      http.get(`${BASE}/remarks`, () => problem(status, 'not_found', 'There is no such link.')),
    );
    show(<SharePage token={TOKEN} />);
    expect(await screen.findByRole('heading', { name: 'This link does not open a drawing' })).toBeVisible();
    expect(screen.getByText(/Ask the person who sent it/)).toBeVisible();
  });

  it('can be tried again where only the server was away', async () => {
    api.use(http.get(BASE, () => problem(503, 'unavailable', 'The service rests for a moment.')));
    const { user } = show(<SharePage token={TOKEN} />);
    const again = await screen.findByRole('button', { name: 'Try again' });
    api.use(
      http.get(BASE, () => HttpResponse.json(shared())),
      http.get(`${BASE}/remarks`, () => HttpResponse.json({ remarks: [] })),
      http.get(`${BASE}/sign-offs`, () => HttpResponse.json({ state: 'issued', signOffs: [] })),
    );
    await user.click(again);
    expect(await screen.findByRole('heading', { name: 'C · R2 turned in' })).toBeVisible();
  });
});
