import { screen, waitFor } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { api, withApi } from '@/tests/components/api';
import { show } from '@/tests/components/show';
import { SignInForm } from './sign-in-form';

const router = { replace: vi.fn(), refresh: vi.fn() };
vi.mock('next/navigation', () => ({ useRouter: () => router }));

withApi();

/** What next-auth answers to a sign-in: the address to go on to, with the error in it. */
function answerSignIn(error: string | null): { seen: URLSearchParams[] } {
  const seen: URLSearchParams[] = [];
  api.use(
    http.get('/api/auth/csrf', () => HttpResponse.json({ csrfToken: 'token-of-the-page' })),
    http.post('/api/auth/callback/credentials', async ({ request }) => {
      seen.push(new URLSearchParams(await request.text()));
      const url = error ? `http://localhost:3000/sign-in?error=${error}` : 'http://localhost:3000/';
      return HttpResponse.json({ url }, { status: error ? 401 : 200 });
    }),
  );
  return { seen };
}

async function fillIn(password = 'a long enough password') {
  const { user } = show(<SignInForm returnTo="/projects/7" />);
  await user.type(screen.getByLabelText('E-mail'), 'Planner@Brackwater.example');
  await user.type(screen.getByLabelText('Password'), password);
  return user;
}

describe('SignInForm', () => {
  beforeEach(() => vi.clearAllMocks());

  it('goes on to the page that was asked for', async () => {
    const { seen } = answerSignIn(null);
    const user = await fillIn();
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    await waitFor(() => expect(router.replace).toHaveBeenCalledWith('/projects/7'));
    expect(Object.fromEntries(seen[0])).toMatchObject({
      csrfToken: 'token-of-the-page',
      email: 'planner@brackwater.example',
      password: 'a long enough password',
    });
  });

  it.each([
    ['CredentialsSignin', /do not belong together/],
    ['too_many_attempts', /Wait a quarter of an hour/],
  ])('says what %s means, keeps what was typed and goes back to the password', async (error, words) => {
    answerSignIn(error);
    const user = await fillIn('wrong password');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText(words)).toBeVisible();
    expect(screen.getByText(words).closest('[role="alert"]')).not.toBeNull();
    expect(screen.getByLabelText('E-mail')).toHaveValue('Planner@Brackwater.example');
    expect(screen.getByLabelText('Password')).toHaveFocus();
    expect(router.replace).not.toHaveBeenCalled();
  });

  it('stays, with what was typed, when the server does not answer', async () => {
    api.use(http.get('/api/auth/csrf', () => HttpResponse.error()));
    const user = await fillIn();
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText(/did not answer/)).toBeVisible();
    expect(screen.getByLabelText('E-mail')).toHaveValue('Planner@Brackwater.example');
  });

  it('says what is missing beside the field, without asking the server', async () => {
    const { user } = show(<SignInForm returnTo="/projects" />);
    await user.type(screen.getByLabelText('E-mail'), 'planner');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText('Write your password.')).toBeVisible();
    expect(screen.getByLabelText('E-mail')).toHaveAccessibleDescription(/such as name@example.com/);
    expect(screen.getByLabelText('E-mail')).toBeInvalid();
  });
});
