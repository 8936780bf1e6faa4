import NextAuth from 'next-auth';
import { authOptions } from '@/lib/server/session';

/** Sign-in, sign-out and the session's end date; next-auth checks its own token against cross-site requests. */
const handler = NextAuth(authOptions);

export { handler as GET, handler as POST };
