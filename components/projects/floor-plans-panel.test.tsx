import { fireEvent, screen } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it, vi } from 'vitest';
import { FLOOR_PLAN_MAX_BYTES, type FloorPlan } from '@/lib/contracts/floor-plans';
import { api, problem, withApi } from '@/tests/components/api';
import { fakeFloorPlan, fakeId } from '@/tests/components/fakes';
import { show } from '@/tests/components/show';
import { FloorPlansPanel } from './floor-plans-panel';

vi.mock('next/navigation', () => ({ useRouter: () => ({ push: vi.fn() }) }));

withApi();

const LIST = `/api/projects/${fakeId(1)}/floor-plans`;

/** A server that takes in what `judge` lets pass. */
function keep(floorPlans: FloorPlan[], judge: (name: string) => Response | null): { uploads: number } {
  const seen = { uploads: 0 };
  api.use(
    http.get(LIST, () => HttpResponse.json({ floorPlans })),
    http.post(LIST, () => {
      seen.uploads += 1;
      const refusal = judge('file');
      if (refusal) return refusal;
      const stored = fakeFloorPlan(50 + seen.uploads, { name: 'hall.png' });
      floorPlans.push(stored);
      return HttpResponse.json(stored, { status: 201 });
    }),
  );
  return seen;
}

const picture = (name: string, bytes = 4): File => new File([new Uint8Array(bytes)], name, { type: 'image/png' });

async function open() {
  const { user } = show(<FloorPlansPanel projectId={fakeId(1)} />);
  await screen.findByText('No floor plan yet');
  return { user, chooser: screen.getByLabelText('Floor plan file') };
}

describe('FloorPlansPanel', () => {
  it('takes a picture in and shows that it has no scale yet', async () => {
    keep([], () => null);
    const { user, chooser } = await open();
    await user.upload(chooser, picture('hall.png'));
    expect(await screen.findByRole('link', { name: 'hall.png' })).toBeVisible();
    expect(screen.getByText('No scale yet')).toBeVisible();
    expect(screen.getByRole('link', { name: 'Set to scale' })).toHaveAttribute(
      'href',
      `/projects/${fakeId(1)}/floor-plans/${fakeId(51)}`,
    );
    expect(screen.queryByRole('progressbar')).toBeNull();
  });

  it('takes a dropped file in as well', async () => {
    const seen = keep([], () => null);
    await open();
    fireEvent.drop(screen.getByText('No floor plan yet'), { dataTransfer: { files: [picture('hall.png')] } });
    expect(await screen.findByRole('link', { name: 'hall.png' })).toBeVisible();
    expect(seen.uploads).toBe(1);
  });

  it('shows the server’s refusal by the name of the file until it is put away', async () => {
    const words =
      'The picture is damaged or cut short. Open it on your computer, save it again and upload the new file.';
    keep([], () => problem(422, 'picture_damaged', words, [{ path: 'file', message: words }]) as Response);
    const { user, chooser } = await open();
    await user.upload(chooser, picture('torn.png'));
    expect(await screen.findByText(words)).toBeVisible();
    expect(screen.getByText('torn.png was not taken in')).toBeVisible();
    expect(screen.getByText(words).closest('[role="alert"]')).not.toBeNull();
    await user.click(screen.getByRole('button', { name: 'Put away' }));
    expect(screen.queryByText(words)).toBeNull();
    expect(screen.getByText('No floor plan yet')).toBeVisible();
  });

  it('refuses what is too large or empty before a byte is sent', async () => {
    const seen = keep([], () => null);
    const { user, chooser } = await open();
    const large = picture('large.png');
    Object.defineProperty(large, 'size', { value: FLOOR_PLAN_MAX_BYTES + 1 });
    await user.upload(chooser, [large, picture('empty.png', 0)]);
    expect(await screen.findByText(/The file has 41 MB; 40 MB is the limit/)).toBeVisible();
    expect(screen.getByText(/empty \(0 bytes\)/)).toBeVisible();
    expect(seen.uploads).toBe(0);
  });

  it('says so when the server cannot be reached', async () => {
    api.use(
      http.get(LIST, () => HttpResponse.json({ floorPlans: [] })),
      http.post(LIST, () => HttpResponse.error()),
    );
    const { user, chooser } = await open();
    await user.upload(chooser, picture('hall.png'));
    expect(await screen.findByText(/The server did not answer/)).toBeVisible();
  });
});
