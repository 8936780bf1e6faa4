import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { problemSchema } from '@/lib/contracts/common';
import { conflict } from '@/lib/server/errors';
import { answer, route } from '@/lib/server/http';
import { logger } from '@/lib/server/logger';
import { callRoute, createMember } from '../factories';

const body = z.object({ name: z.string().min(1, 'Write a name.'), size: z.object({ widthMm: z.number() }) });
const write = route({ role: 'public', body }, async ({ body }) => answer(body, { status: 201 }));
const good = { name: 'Bay', size: { widthMm: 9000 } };

async function problemOf(response: Response) {
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  const problem = problemSchema.loose().parse(await response.json());
  expect(problem.status).toBe(response.status);
  expect(problem.requestId).toBe(response.headers.get('x-request-id'));
  return problem;
}

afterEach(() => vi.restoreAllMocks());

describe('a wrapped route', () => {
  it('answers what the handler returns as JSON that no cache keeps', async () => {
    const response = await callRoute(write, { method: 'POST', body: good });
    expect(response.status).toBe(201);
    expect(response.headers.get('cache-control')).toBe('no-store');
    expect(await response.json()).toEqual(good);
  });

  it('answers 204 where the handler returns nothing', async () => {
    const response = await callRoute(route({ role: 'public' }, async () => undefined));
    expect(response.status).toBe(204);
  });

  it('names every refused field and what to do about it', async () => {
    const problem = await problemOf(await callRoute(write, { method: 'POST', body: { name: '', size: {} } }));
    expect(problem).toMatchObject({ status: 422, code: 'invalid' });
    expect(problem.errors?.map((error) => error.path)).toEqual(['name', 'size.widthMm']);
    expect(problem.errors?.[0].message).toBe('Write a name.');
  });

  it('refuses what is not JSON, and more than it can hold', async () => {
    const asText = { 'content-type': 'text/plain' };
    expect((await problemOf(await callRoute(write, { method: 'POST', body: good, headers: asText }))).status).toBe(415);
    const broken = new Request('http://elbowroom.test/', {
      method: 'POST',
      headers: { 'sec-fetch-site': 'same-origin', 'content-type': 'application/json' },
      body: '{"name":',
    });
    expect((await problemOf(await write(broken))).code).toBe('malformed_json');
    const huge = { ...good, name: 'x'.repeat(5_000_000) };
    expect((await problemOf(await callRoute(write, { method: 'POST', body: huge }))).status).toBe(413);
  });

  it('treats an address with a malformed id like an unknown one', async () => {
    const read = route({ role: 'public', params: z.object({ id: z.uuid() }) }, async ({ params }) => params);
    expect((await problemOf(await callRoute(read, { params: { id: "1' OR 1=1" } }))).status).toBe(404);
  });

  it('checks the query like any other input', async () => {
    const query = z.object({ width: z.coerce.number().int() });
    const read = route({ role: 'public', query }, async ({ query }) => query);
    expect(await (await callRoute(read, { path: '/?width=7' })).json()).toEqual({ width: 7 });
    expect((await problemOf(await callRoute(read, { path: '/?width=x' }))).errors?.[0].path).toBe('width');
  });

  it('adds what a conflict has to show to the problem', async () => {
    const read = route({ role: 'public' }, async () => {
      throw conflict('stale_item', 'Changed by somebody else.', { conflicts: [1] });
    });
    expect(await problemOf(await callRoute(read))).toMatchObject({ status: 409, code: 'stale_item', conflicts: [1] });
  });

  it('keeps the cause of a fault to itself', async () => {
    const log = vi.spyOn(logger, 'error').mockImplementation(() => undefined);
    const read = route({ role: 'public' }, async () => {
      throw new Error('relation "secrets" does not exist');
    });
    const response = await callRoute(read);
    const problem = await problemOf(response);
    expect(problem.status).toBe(500);
    expect(JSON.stringify(problem)).not.toContain('secrets');
    expect(log).toHaveBeenCalledOnce();
  });

  it('keeps tokens of links out of the log', async () => {
    const log = vi.spyOn(logger, 'info').mockImplementation(() => undefined);
    const token = 'k'.repeat(43);
    await callRoute(
      route({ role: 'public' }, async () => ({})),
      { path: `/api/share/${token}/remarks` },
    );
    expect(log.mock.calls[0][0]).toMatchObject({ path: '/api/share/[token]/remarks', status: 200 });
  });
});

describe('the same-origin check', () => {
  const cases: [string, Record<string, string | null>, number][] = [
    ['a page of ours', { 'sec-fetch-site': 'same-origin' }, 201],
    ['a page of another site', { 'sec-fetch-site': 'cross-site' }, 403],
    ['a page of a sister domain', { 'sec-fetch-site': 'same-site' }, 403],
    [
      'an older browser on our page',
      { 'sec-fetch-site': null, origin: 'http://elbowroom.test', host: 'elbowroom.test' },
      201,
    ],
    [
      'an older browser on a foreign page',
      { 'sec-fetch-site': null, origin: 'http://evil.test', host: 'elbowroom.test' },
      403,
    ],
    ['a foreign page with its origin hidden', { 'sec-fetch-site': null, origin: 'null', host: 'elbowroom.test' }, 403],
    ['no browser at all', { 'sec-fetch-site': null }, 403],
  ];
  it.each(cases)('for a change asked by %s', async (_who, headers, status) => {
    expect((await callRoute(write, { method: 'POST', body: good, headers })).status).toBe(status);
  });

  it('lets anybody read what is public', async () => {
    const read = route({ role: 'public' }, async () => ({}));
    expect((await callRoute(read, { headers: { 'sec-fetch-site': 'cross-site' } })).status).toBe(200);
  });
});

describe('the role of a route', () => {
  const integratorsOnly = route({ role: 'integrator' }, async ({ actor }) => ({ role: actor.role }));

  it.each([
    ['viewer', 403],
    ['planner', 403],
    ['integrator', 200],
    ['admin', 200],
  ] as const)('answers a %s %i', async (role, status) => {
    expect((await callRoute(integratorsOnly, { as: await createMember(role) })).status).toBe(status);
  });

  it('answers nobody 401', async () => {
    expect((await problemOf(await callRoute(integratorsOnly))).code).toBe('signed_out');
  });
});
