import type { NextAuthOptions } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { env } from '../env';
import { SESSION_COOKIE, SESSION_MAX_AGE_S, useSecureCookies } from './cookie';
import { checkCredentials } from './check-credentials';

// next-auth reads its own address from the environment only; ours has one name for it.
process.env.NEXTAUTH_URL ??= env.APP_URL;

const cookieOptions = { httpOnly: true, sameSite: 'lax', path: '/', secure: useSecureCookies } as const;

export const authOptions: NextAuthOptions = {
  secret: env.AUTH_SECRET,
  session: { strategy: 'jwt', maxAge: SESSION_MAX_AGE_S },
  useSecureCookies,
  cookies: { sessionToken: { name: SESSION_COOKIE, options: cookieOptions } },
  pages: { signIn: '/sign-in', signOut: '/sign-in', error: '/sign-in' },
  providers: [
    CredentialsProvider({
      name: 'E-mail and password',
      credentials: { email: { label: 'E-mail', type: 'email' }, password: { label: 'Password', type: 'password' } },
      authorize: (credentials, request) => checkCredentials(credentials, request.headers),
    }),
  ],
  callbacks: {
    // `user` is there at sign-in only; later calls pass the token through.
    jwt: ({ token, user }) => (user ? { sub: user.id, generation: user.generation } : token),
    // GET /api/auth/session says that there is a session and until when; who it is answers GET /api/account.
    session: ({ session }) => ({ expires: session.expires }),
  },
};

declare module 'next-auth' {
  interface User {
    generation: number;
  }
}
