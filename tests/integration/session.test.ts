import type { NextApiRequest, NextApiResponse } from 'next';
import { encode } from 'next-auth/jwt';
import NextAuth from 'next-auth';
import { describe, expect, it } from 'vitest';
import { env } from '@/lib/server/env';
import { authOptions, readActor } from '@/lib/server/session';
import { checkCredentials } from '@/lib/server/session/check-credentials';
import { SESSION_COOKIE } from '@/lib/server/session/cookie';
import { cookieOf, createMember, createProject, createUser, PASSWORD, someAddress, uniqueEmail } from '../factories';

const withCookie = (cookie: string) => new Request('http://elbowroom.test/', { headers: { cookie } });
const from = (address: string) => ({ 'x-forwarded-for': address });

/** Runs next-auth itself, as the route does, and answers what it would send. */
async function callNextAuth(action: string[], method: string, cookies: Record<string, string>, body: object = {}) {
  const set: string[] = [];
  let sent: { url?: string; csrfToken?: string } = {};
  const headers = { host: 'elbowroom.test', ...from(someAddress()) };
  const request = { query: { nextauth: action }, method, headers, cookies, body };
  const response = {
    status: () => response,
    setHeader: (name: string, value: string | string[]) => {
      if (name.toLowerCase() === 'set-cookie') set.splice(0, set.length, ...[value].flat());
      return response;
    },
    getHeader: () => set,
    json: (data: object) => (sent = data),
    send: (data: object) => (sent = data),
    end: () => undefined,
  };
  await NextAuth(request as unknown as NextApiRequest, response as unknown as NextApiResponse, authOptions);
  const jar = set
    .map((line) => line.split(';')[0].split('='))
    .map(([name, ...value]) => [name, decodeURIComponent(value.join('='))]);
  return { sent, cookies: { ...cookies, ...Object.fromEntries(jar) } as Record<string, string>, set };
}

async function signIn(email: string, password: string) {
  const { sent, cookies } = await callNextAuth(['csrf'], 'GET', {});
  const form = { email, password, csrfToken: sent.csrfToken, json: 'true' };
  return callNextAuth(['callback', 'credentials'], 'POST', cookies, form);
}

describe('signing in', () => {
  it('sets a cookie that says who it is', async () => {
    const { user, actor } = await createMember('planner');
    const { cookies, set } = await signIn(user.email.toUpperCase(), PASSWORD);
    const line = set.find((cookie) => cookie.startsWith(SESSION_COOKIE)) ?? '';
    expect(line).toMatch(/HttpOnly/);
    expect(line).toMatch(/SameSite=Lax/i);
    expect(await readActor(withCookie(`${SESSION_COOKIE}=${cookies[SESSION_COOKIE]}`))).toEqual(actor);
  });

  it('refuses a wrong password, an unknown address and a person without an organisation alike', async () => {
    const { user } = await createMember('planner');
    const outsider = await createUser();
    for (const [email, password] of [
      [user.email, 'wrong password'],
      [uniqueEmail(), PASSWORD],
      [outsider.email, PASSWORD],
    ]) {
      const { sent, cookies } = await signIn(email, password);
      expect(new URL(sent.url ?? '').searchParams.get('error')).toBe('CredentialsSignin');
      expect(cookies[SESSION_COOKIE]).toBeUndefined();
    }
  });

  it('keeps passwords as argon2id', async () => {
    expect((await createUser()).passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  it('shuts after ten wrong passwords from one address, also for the right one, but not for another address', async () => {
    const { user } = await createMember('planner');
    const address = someAddress();
    for (let i = 0; i < 10; i += 1) {
      expect(await checkCredentials({ email: user.email, password: 'wrong password' }, from(address))).toBeNull();
    }
    const right = { email: user.email, password: PASSWORD };
    await expect(checkCredentials(right, from(address))).rejects.toThrow('too_many_attempts');
    expect(await checkCredentials(right, from(someAddress()))).toEqual({ id: user.id, generation: 1 });
  });

  it('does not count right passwords', async () => {
    const { user } = await createMember('planner');
    const address = someAddress();
    for (let i = 0; i < 12; i += 1) {
      expect(await checkCredentials({ email: user.email, password: PASSWORD }, from(address))).not.toBeNull();
    }
  });
});

describe('a session', () => {
  it('reads role, organisation and projects anew with every request', async () => {
    const member = await createMember('planner');
    const project = await createProject({ organisationId: member.organisationId });
    expect(await readActor(withCookie(member.cookie))).toMatchObject({ role: 'planner', projectIds: null });
    await member.membership.update({ role: 'viewer' });
    expect(await readActor(withCookie(member.cookie))).toMatchObject({ role: 'viewer', projectIds: [] });
    const viewer = await createMember('viewer', { organisationId: member.organisationId, projectIds: [project.id] });
    expect(await readActor(withCookie(viewer.cookie))).toEqual(viewer.actor);
  });

  it('is over at once for somebody who was removed', async () => {
    const member = await createMember('planner');
    await member.membership.destroy();
    expect(await readActor(withCookie(member.cookie))).toBeNull();
  });

  it('is over when the password changes', async () => {
    const member = await createMember('planner');
    await member.user.update({ sessionGeneration: 2 });
    expect(await readActor(withCookie(member.cookie))).toBeNull();
    expect(await readActor(withCookie(await cookieOf(member.user)))).toEqual(member.actor);
  });

  it('is not made by a forged, foreign or expired cookie', async () => {
    const { user } = await createMember('admin');
    const claims = { sub: user.id, generation: 1 };
    const forged = await encode({ token: claims, secret: 'another secret of the same length, more or less' });
    const expired = await encode({ token: claims, secret: env.AUTH_SECRET, maxAge: -60 });
    for (const value of [forged, expired, 'nonsense', '%']) {
      expect(await readActor(withCookie(`${SESSION_COOKIE}=${value}`))).toBeNull();
    }
    expect(await readActor(new Request('http://elbowroom.test/'))).toBeNull();
  });
});
