import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { LibraryArm, NewArmVersion } from '@/lib/contracts/arms';
import { api, problem, withApi } from '@/tests/components/api';
import { fakeArm } from '@/tests/components/arms';
import { show } from '@/tests/components/show';
import { ArmPage } from './arm-page';

const router = { push: vi.fn(), replace: vi.fn() };
vi.mock('next/navigation', () => ({ useRouter: () => router }));
// What it computes is tested by itself; here it would only take time.
vi.mock('@/lib/layout/arm-study', () => ({
  studyArm: function* () {
    yield null;
  },
}));

withApi();
beforeEach(() => {
  sessionStorage.clear();
  vi.clearAllMocks();
});

const ARM = fakeArm(1, { version: 3, layoutCount: 4 });

/** A library of these versions, newest first; saves are answered by `answer`. */
function keep(versions: LibraryArm[], answer?: (body: NewArmVersion) => Response): NewArmVersion[] {
  const saved: NewArmVersion[] = [];
  for (const version of versions) {
    api.use(
      http.get(`/api/arms/${version.id}`, () => HttpResponse.json(version)),
      http.get(`/api/arms/${version.id}/versions`, () => HttpResponse.json({ arms: versions })),
      http.post(`/api/arms/${version.id}/versions`, async ({ request }) => {
        const body = (await request.json()) as NewArmVersion;
        saved.push(body);
        return answer?.(body);
      }),
    );
  }
  return saved;
}

async function open(arm = ARM, role: 'planner' | 'integrator' = 'integrator') {
  const { user, unmount } = show(<ArmPage armId={arm.id} />, role);
  await screen.findByRole('heading', { level: 1, name: arm.name });
  return { user, unmount };
}

const cell = (name: string) => screen.getByLabelText<HTMLInputElement>(name);
const saveButton = (version = 4) => screen.getByRole('button', { name: `Save as version ${version}` });

describe('ArmPage for an integrator', () => {
  it('says at once what is wrong with a limit, marks its cell and does not save', async () => {
    keep([ARM]);
    const { user } = await open();
    expect(saveButton()).toBeDisabled();
    const from = cell('Joint 3, Lower limit');
    await user.clear(from);
    await user.type(from, '95');
    const words = 'Joint 3 starts at 95° and ends at 75°. The start must be below the end.';
    expect(screen.getByRole('button', { name: words })).toBeVisible();
    expect(from).toHaveAttribute('aria-invalid', 'true');
    expect(from).toHaveAccessibleDescription(words);
    expect(saveButton()).toBeDisabled();
    await user.click(screen.getByRole('button', { name: words }));
    expect(from).toHaveFocus();
    await user.clear(from);
    await user.type(from, '-200');
    expect(screen.queryByText(words)).toBeNull();
    expect(saveButton()).toBeEnabled();
  });

  it('saves the next version with what was typed and nothing else changed', async () => {
    const next = fakeArm(2, { version: 4 });
    const saved = keep([ARM], () => HttpResponse.json(next, { status: 201 }) as Response);
    const { user } = await open();
    await user.clear(cell('Joint 1, Link length a'));
    await user.type(cell('Joint 1, Link length a'), '155,5');
    await user.click(saveButton());
    await waitFor(() => expect(router.replace).toHaveBeenCalledWith(`/arms/${next.id}`));
    const expected = structuredClone(ARM.definition);
    expected.joints[0].a = 0.1555;
    const { name, description, payloadKg } = ARM;
    expect(saved).toEqual([{ name, description, payloadKg, definition: expected, baseVersion: 3 }]);
  });

  it('goes from cell to cell by keyboard and takes a pasted block', async () => {
    keep([ARM]);
    const { user } = await open();
    await user.click(cell('Joint 1, Offset d'));
    await user.keyboard('{Enter}');
    expect(cell('Joint 2, Offset d')).toHaveFocus();
    await user.keyboard('{ArrowUp}{ArrowLeft}');
    expect(cell('Joint 1, Twist alpha')).toHaveFocus();
    await user.keyboard('{ArrowRight}{ArrowRight}');
    expect(cell('Joint 1, Angle theta')).toHaveFocus();
    fireEvent.paste(cell('Joint 5, Speed limit'), {
      clipboardData: { getData: () => '201\t301\r\n202\t302\r\n' },
    });
    expect(cell('Joint 5, Speed limit')).toHaveValue('201');
    expect(cell('Joint 6, Acceleration limit')).toHaveValue('302');
  });

  it('adds a joint that is to be filled in, moves it and removes it again', async () => {
    keep([ARM]);
    const { user } = await open();
    await user.click(screen.getByRole('button', { name: 'Add joint' }));
    expect(screen.getByText('Joint 7: fill in from, to, speed and ramp.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Move or remove joint 7' }));
    await user.click(await screen.findByRole('menuitem', { name: 'Move towards the base' }));
    expect(screen.getByText('Joint 6: fill in from, to, speed and ramp.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Move or remove joint 6' }));
    await user.click(await screen.findByRole('menuitem', { name: 'Remove joint 6' }));
    expect(screen.queryByText(/fill in/)).toBeNull();
    expect(cell('Joint 6, Upper limit')).toHaveValue('360');
  });

  it('shows what somebody else saved meanwhile and saves on top of it when asked to', async () => {
    const newer = fakeArm(2, { version: 4, payloadKg: 14 });
    const mine = fakeArm(3, { version: 5 });
    const stale = () =>
      HttpResponse.json(
        {
          type: 'about:blank',
          title: 'Conflict',
          status: 409,
          code: 'stale_arm',
          detail: 'Newer',
          requestId: 'x',
          newest: newer,
        },
        { status: 409 },
      ) as Response;
    const saved = keep([ARM], ({ baseVersion }) =>
      baseVersion === 3 ? stale() : (HttpResponse.json(mine, { status: 201 }) as Response),
    );
    const { user } = await open();
    await user.type(cell('Name'), ' B');
    await user.click(saveButton());
    const dialog = await screen.findByRole('dialog', { name: 'Version 4 was saved meanwhile' });
    expect(within(dialog).getByText('Payload: 12 kg → 14 kg.')).toBeVisible();
    await user.click(within(dialog).getByRole('button', { name: 'Save mine as version 5' }));
    await waitFor(() => expect(router.replace).toHaveBeenCalledWith(`/arms/${mine.id}`));
    expect(saved.map(({ baseVersion }) => baseVersion)).toEqual([3, 4]);
    expect(saved[1].name).toBe(`${ARM.name} B`);
  });

  it('puts what the server refuses beside its cell', async () => {
    const words = 'The tool of this chain never leaves its first axis.';
    keep([ARM], () => problem(422, 'invalid', words, [{ path: 'definition.joints.1.a', message: words }]) as Response);
    const { user } = await open();
    await user.type(cell('Name'), ' B');
    await user.click(saveButton());
    expect(await screen.findByText(words)).toBeVisible();
    expect(cell('Joint 2, Link length a')).toHaveAttribute('aria-invalid', 'true');
    expect(cell('Name')).toHaveValue(`${ARM.name} B`);
  });

  it('asks before a link takes unsaved edits away, and brings them back after a reload', async () => {
    keep([ARM, fakeArm(9, { version: 2, latest: false })]);
    const { user, unmount } = await open();
    const link = await screen.findByRole('link', { name: 'Version 2' });
    await user.type(cell('Name'), ' B');
    await user.click(link);
    const dialog = await screen.findByRole('dialog', { name: 'Leave without saving?' });
    await user.click(within(dialog).getByRole('button', { name: 'Stay here' }));
    expect(router.push).not.toHaveBeenCalled();
    expect(cell('Name')).toHaveValue(`${ARM.name} B`);
    unmount();
    show(<ArmPage armId={ARM.id} />, 'integrator');
    expect(await screen.findByText('The edits that you had not saved are back.')).toBeVisible();
    expect(cell('Name')).toHaveValue(`${ARM.name} B`);
    await user.click(screen.getByRole('button', { name: 'Let them go' }));
    expect(cell('Name')).toHaveValue(ARM.name);
  });

  it('shows the coupling of an arm that has one, and no other', async () => {
    const { joints } = ARM.definition;
    const driven = { min: -1, max: 1, maxSpeed: 2, maxAcceleration: 3 };
    const arm = fakeArm(5, {
      definition: {
        convention: 'standard',
        joints: joints.slice(0, 2),
        coupling: [
          [1, 0],
          [-1, 1],
        ],
        actuators: [driven, driven],
      },
    });
    keep([arm]);
    await open(arm);
    expect(screen.getByRole('table', { name: 'Coupling: joints by actuators' })).toBeVisible();
    expect(cell('Joint 2 a unit of actuator 1')).toHaveValue('\u22121');
    expect(screen.getByRole('table', { name: 'Actuators' })).toBeVisible();
  });
});

describe('ArmPage for reading', () => {
  it('gives planners the figures and no way to change them', async () => {
    keep([ARM]);
    await open(ARM, 'planner');
    expect(screen.queryByLabelText('Joint 1, Link length a')).toBeNull();
    expect(screen.queryByRole('button', { name: /Save|Copy/ })).toBeNull();
    expect(screen.getByText(/their maps stay with the version that made them/)).toHaveTextContent('Used in 4 layouts');
  });

  it('leads from an older version to the newest and tells what changed', async () => {
    const older = fakeArm(7, { version: 2, latest: false, payloadKg: 10 });
    keep([ARM, older]);
    await open(older);
    expect(await screen.findByRole('link', { name: 'Open version 3' })).toHaveAttribute('href', `/arms/${ARM.id}`);
    expect(screen.queryByRole('button', { name: /Save/ })).toBeNull();
  });
});
