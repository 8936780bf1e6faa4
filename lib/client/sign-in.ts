import { z } from 'zod';
import { fetcher } from './fetcher';

export type SignInOutcome = 'signed in' | 'wrong' | 'too many attempts' | 'no answer';

const csrfSchema = z.object({ csrfToken: z.string() });
const outcomeSchema = z.object({ url: z.string() });

/**
 * Signs in with e-mail and password through next-auth's own addresses. Its client helper is left aside: where the server
 * does not answer it takes the reader to an error page, and what was typed is gone.
 */
export async function signInWith(email: string, password: string): Promise<SignInOutcome> {
  try {
    const { csrfToken } = await fetcher('/api/auth/csrf', csrfSchema);
    const response = await fetch('/api/auth/callback/credentials', {
      method: 'POST',
      headers: { 'Content-Type': 'application/x-www-form-urlencoded' },
      body: new URLSearchParams({ csrfToken, email, password, json: 'true', callbackUrl: window.location.origin }),
    });
    const { url } = outcomeSchema.parse(await response.json());
    const error = new URL(url, window.location.origin).searchParams.get('error');
    if (error === 'too_many_attempts') return 'too many attempts';
    return response.ok && !error ? 'signed in' : 'wrong';
  } catch {
    return 'no answer';
  }
}
