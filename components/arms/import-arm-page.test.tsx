import { screen, waitFor } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { ArmContent } from '@/lib/contracts/arms';
import { TABLE_EXAMPLE } from '@/lib/layout/arm-import/table-example';
import { api, withApi } from '@/tests/components/api';
import { fakeArm } from '@/tests/components/arms';
import { show } from '@/tests/components/show';
import { ImportArmPage } from './import-arm-page';

const router = { push: vi.fn(), replace: vi.fn() };
vi.mock('next/navigation', () => ({ useRouter: () => router }));
// What it computes is tested by itself; here it would only take time.
vi.mock('@/lib/layout/arm-study', () => ({
  studyArm: function* () {
    yield null;
  },
}));

withApi();
beforeEach(() => vi.clearAllMocks());

function keep(): ArmContent[] {
  const added: ArmContent[] = [];
  api.use(
    http.post('/api/arms', async ({ request }) => {
      added.push((await request.json()) as ArmContent);
      return HttpResponse.json(fakeArm(40), { status: 201 });
    }),
  );
  return added;
}

const file = (text: string, name: string) => new File([text], name);
const addButton = () => screen.getByRole('button', { name: 'Add to the library' });

const URDF = `<robot name="Two links"><link name="base"/><link name="upper"/><link name="fore"/><link name="camera"/>
<joint name="shoulder" type="revolute"><parent link="base"/><child link="upper"/><axis xyz="0 0 1"/>
<limit lower="-2" upper="2" velocity="3"/></joint>
<joint name="elbow" type="revolute"><parent link="upper"/><child link="fore"/><origin xyz="0.5 0 0"/><axis xyz="0 0 1"/>
<limit lower="-2" upper="2" velocity="3"/></joint>
<joint name="mount" type="fixed"><parent link="upper"/><child link="camera"/><origin xyz="0.3 0 0"/></joint></robot>`;

describe('ImportArmPage', () => {
  it('shows a table before it is added, lets it be completed and adds it', async () => {
    const added = keep();
    const { user } = show(<ImportArmPage />, 'integrator');
    await user.upload(screen.getByLabelText('Arm file'), file(TABLE_EXAMPLE, 'scara.csv'));
    expect(await screen.findByText('scara.csv')).toBeVisible();
    expect(screen.getByLabelText('Joint 3, kind')).toHaveValue('prismatic');
    expect(screen.getByLabelText('Joint 3, Upper limit')).toHaveValue('200');
    expect(addButton()).toBeDisabled();
    expect(screen.getByRole('button', { name: 'Give the arm a name.' })).toBeVisible();
    await user.type(screen.getByLabelText('Name'), 'SCARA');
    await user.click(addButton());
    await waitFor(() => expect(router.replace).toHaveBeenCalledWith(`/arms/${fakeArm(40).id}`));
    expect(added[0].definition.joints[1]).toMatchObject({ a: 0.275, alpha: Math.PI });
  });

  it('names the places of a table that it cannot read, and keeps the text', async () => {
    const { user } = show(<ImportArmPage />, 'integrator');
    const text = TABLE_EXAMPLE.replace('325', 'long');
    await user.click(screen.getByLabelText('Or paste its text'));
    await user.paste(text);
    await user.click(screen.getByRole('button', { name: 'Read the text' }));
    const [refusal] = await screen.findAllByRole('listitem');
    expect(refusal).toHaveTextContent('Line 3, column a. “long” is no number.');
    expect(screen.getByLabelText('Or paste its text')).toHaveValue(text);
  });

  it('shows a bad limit of a table with the words of the form', async () => {
    const { user } = show(<ImportArmPage />, 'integrator');
    await user.upload(
      screen.getByLabelText('Arm file'),
      file(TABLE_EXAMPLE.replace('-132;132', '132;-132'), 'bad.csv'),
    );
    expect(
      await screen.findByText('Joint 1 starts at 132° and ends at -132°. The start must be below the end.'),
    ).toBeVisible();
  });

  it('asks for the ramps of a URDF file and for its chain', async () => {
    const added = keep();
    const { user } = show(<ImportArmPage />, 'integrator');
    await user.upload(screen.getByLabelText('Arm file'), file(URDF, 'two.urdf'));
    expect(await screen.findByText('URDF says nothing of acceleration: fill in the column ramp.')).toBeVisible();
    expect(screen.getByLabelText('To the link')).toHaveTextContent('fore');
    expect(screen.getByText('Joint 1: fill in ramp.')).toBeVisible();
    await user.type(screen.getByLabelText(/From rest to full speed/), '0.5');
    await user.click(screen.getByRole('button', { name: 'Fill in the ramps' }));
    await user.click(addButton());
    await waitFor(() => expect(added).toHaveLength(1));
    expect(added[0].name).toBe('Two links');
    expect(added[0].definition.joints[0]).toMatchObject({ a: 0.5, maxSpeed: 3, maxAcceleration: 6 });
  });

  it('refuses a file that would fetch something, and one that is too large', async () => {
    const { user } = show(<ImportArmPage />, 'integrator');
    const chooser = screen.getByLabelText('Arm file');
    await user.upload(chooser, file('<!DOCTYPE r [<!ENTITY x SYSTEM "file:///x">]><robot>&x;</robot>', 'bad.urdf'));
    expect(await screen.findByText(/declares a document type/)).toBeVisible();
    const large = file('x', 'large.csv');
    Object.defineProperty(large, 'size', { value: 2 * 1024 * 1024 });
    await user.upload(chooser, large);
    expect(await screen.findByText(/larger than 1 MB/)).toBeVisible();
  });
});
