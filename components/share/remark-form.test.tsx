import type { ComponentProps } from 'react';
import { screen, waitFor } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { ProblemError } from '@/lib/client/fetcher';
import { show } from '@/tests/components/show';
import { RemarkForm } from './remark-form';

const guest = { name: 'Vera Quill', email: 'vera@quillfen.example' };
const form = (onSend: ComponentProps<typeof RemarkForm>['onSend'], asGuest = true) => (
  <RemarkForm label="Your remark" sendLabel="Pin the remark" asGuest={asGuest} onSend={onSend} />
);

beforeEach(() => localStorage.clear());

describe('the remark form', () => {
  it('asks a guest who they are and keeps it for the next remark', async () => {
    const onSend = vi.fn(async () => {});
    const { user, unmount } = show(form(onSend));
    await user.type(screen.getByLabelText('Your remark'), 'The cart needs 900 mm.');
    await user.type(screen.getByLabelText('Your name'), guest.name);
    await user.type(screen.getByLabelText('Your e-mail address'), 'Vera@Quillfen.example');
    await user.click(screen.getByRole('button', { name: 'Pin the remark' }));
    // The contract writes addresses small.
    await waitFor(() =>
      expect(onSend).toHaveBeenCalledWith({ body: 'The cart needs 900 mm.', mentions: [] }, guest, null),
    );
    await waitFor(() => expect(screen.getByLabelText('Your remark')).toHaveValue(''));
    unmount();

    const again = show(form(onSend));
    expect(screen.queryByLabelText('Your name')).not.toBeInTheDocument();
    expect(screen.getByText(/As Vera Quill/)).toBeVisible();
    await again.user.type(screen.getByLabelText('Your remark'), 'And a door.');
    await again.user.click(screen.getByRole('button', { name: 'Pin the remark' }));
    await waitFor(() => expect(onSend).toHaveBeenLastCalledWith({ body: 'And a door.', mentions: [] }, guest, null));
  });

  it('says what is missing and sends nothing', async () => {
    const onSend = vi.fn(async () => {});
    const { user } = show(form(onSend));
    await user.type(screen.getByLabelText('Your e-mail address'), 'vera');
    await user.click(screen.getByRole('button', { name: 'Pin the remark' }));
    expect(await screen.findByText('Write what you want to say.')).toBeVisible();
    expect(screen.getByText('Write your name.')).toBeVisible();
    expect(screen.getByText('Write an e-mail address such as name@example.com.')).toBeVisible();
    expect(onSend).not.toHaveBeenCalled();
  });

  it('keeps what was typed when the server refuses', async () => {
    const onSend = vi.fn(async () => {
      throw new ProblemError({
        type: 'about:blank',
        title: 'Too many',
        status: 429,
        code: 'too_many_requests',
        detail: 'That was a lot at once. Try again in a minute.',
        requestId: 'test',
      });
    });
    const { user } = show(form(onSend, false));
    await user.type(screen.getByLabelText('Your remark'), 'A remark');
    await user.click(screen.getByRole('button', { name: 'Pin the remark' }));
    expect(await screen.findByText('That was a lot at once. Try again in a minute.')).toBeVisible();
    expect(screen.getByLabelText('Your remark')).toHaveValue('A remark');
  });

  it('lets somebody else write on the same browser', async () => {
    localStorage.setItem('elbowroom.guest', JSON.stringify(guest));
    const { user } = show(form(async () => {}));
    await user.click(screen.getByRole('button', { name: 'Somebody else' }));
    expect(screen.getByLabelText('Your name')).toHaveValue('');
    expect(localStorage.getItem('elbowroom.guest')).toBeNull();
  });

  it('knows a member', () => {
    show(form(async () => {}, false));
    expect(screen.queryByLabelText('Your name')).not.toBeInTheDocument();
  });
});
