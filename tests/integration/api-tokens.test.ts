import { beforeAll, describe, expect, it } from 'vitest';
import { GET as getAccount } from '@/app/api/account/route';
import { GET as getAudit } from '@/app/api/audit/route';
import { GET as getAuditCsv } from '@/app/api/audit/csv/route';
import { GET as getProjects, POST as postProject } from '@/app/api/projects/route';
import { DELETE as revoke } from '@/app/api/tokens/[tokenId]/route';
import { GET as list, POST as create } from '@/app/api/tokens/route';
import {
  apiTokenListSchema,
  newApiTokenSchema,
  type ApiTokenRequest,
  type NewApiToken,
} from '@/lib/contracts/api-tokens';
import { auditPageSchema } from '@/lib/contracts/audit';
import { accountSchema } from '@/lib/contracts/accounts';
import { ApiToken, AuditEvent } from '@/models';
import { callRoute, createMember, unique, type CallOptions, type Handler, type TestMember } from '@/tests/factories';

let integrator: TestMember;
beforeAll(async () => {
  integrator = await createMember('integrator');
});

async function make(request: Partial<ApiTokenRequest> = {}, as = integrator): Promise<NewApiToken> {
  const body = { name: 'Nightly export', role: 'planner', ...request };
  const response = await callRoute(create, { as, method: 'POST', body });
  expect(response.status).toBe(201);
  return newApiTokenSchema.parse(await response.json());
}

/** As a program would: no cookie, and no word of a page. */
const call = (handler: Handler, token: string, options: CallOptions = {}) =>
  callRoute(handler, {
    ...options,
    headers: { authorization: `Bearer ${token}`, 'sec-fetch-site': null, ...options.headers },
  });

describe('an API token', () => {
  it('acts for its owner without cookie or page, is kept as a hash only, and notes its last use', async () => {
    const { token, id, hint } = await make({ readOnly: false });
    expect(token).toMatch(/^elbow_[\w-]{43}$/);
    const row = await ApiToken.findByPk(id, { rejectOnEmpty: true });
    expect(JSON.stringify(row)).not.toContain(token);
    const account = accountSchema.parse(await (await call(getAccount, token)).json());
    expect(account).toMatchObject({ email: integrator.user.email, role: 'planner' });
    const made = await call(postProject, token, { method: 'POST', body: { name: unique('By a program') } });
    expect(made.status).toBe(201);
    const { tokens } = apiTokenListSchema.parse(await (await callRoute(list, { as: integrator })).json());
    const listed = tokens.find((each) => each.id === id);
    expect(listed).toMatchObject({ hint, role: 'planner' });
    expect(listed?.lastUsedAt).not.toBeNull();
    expect(JSON.stringify(tokens)).not.toContain(token);
  });

  it('that may only read changes nothing', async () => {
    const { token } = await make();
    expect((await call(getProjects, token)).status).toBe(200);
    const refused = await call(postProject, token, { method: 'POST', body: { name: 'No' } });
    expect(refused.status).toBe(403);
    expect(await refused.json()).toMatchObject({ code: 'token_read_only' });
  });

  it('may never do more than its owner, not even after the owner may do less', async () => {
    const planner = await createMember('planner', { organisationId: integrator.organisationId });
    const above = await callRoute(create, { as: planner, method: 'POST', body: { name: 'Up', role: 'admin' } });
    expect(above.status).toBe(422);
    expect(await above.json()).toMatchObject({ errors: [{ path: 'role' }] });
    const { token } = await make({ role: 'planner' }, planner);
    await planner.membership.update({ role: 'viewer' });
    expect(accountSchema.parse(await (await call(getAccount, token)).json()).role).toBe('viewer');
    await planner.membership.destroy();
    expect((await call(getAccount, token)).status).toBe(401);
  });

  it('is over when it is taken back, has expired or is another one, whatever cookie comes with it', async () => {
    const { token, id } = await make();
    expect((await call(getAccount, `${token.slice(0, -1)}?`, { as: integrator })).status).toBe(401);
    expect((await call(getAccount, '', { as: integrator })).status).toBe(401);
    const stranger = await createMember('admin');
    expect((await callRoute(revoke, { as: stranger, method: 'DELETE', params: { tokenId: id } })).status).toBe(404);
    expect((await call(getAccount, token)).status).toBe(200);
    expect((await callRoute(revoke, { as: integrator, method: 'DELETE', params: { tokenId: id } })).status).toBe(200);
    expect((await call(getAccount, token)).status).toBe(401);
    const old = await make();
    await ApiToken.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { id: old.id } });
    expect((await call(getAccount, old.token)).status).toBe(401);
  });

  it('cannot make tokens', async () => {
    const { token } = await make({ readOnly: false });
    const response = await call(create, token, { method: 'POST', body: { name: 'Child', role: 'viewer' } });
    expect(response.status).toBe(403);
  });

  it('leaves the same-origin check to those who come with a cookie', async () => {
    const body = { name: unique('Project') };
    const response = await callRoute(postProject, {
      as: integrator,
      method: 'POST',
      body,
      headers: { 'sec-fetch-site': 'cross-site' },
    });
    expect(response.status).toBe(403);
  });
});

describe('the audit', () => {
  it('says who did what through which token, filtered, page by page, and as CSV', async () => {
    const admin = await createMember('admin', { name: '=cmd Admin' });
    const { token, id } = await make({ role: 'admin', readOnly: false }, admin);
    await call(postProject, token, { method: 'POST', body: { name: unique('P') } });
    const read = async (query: string) =>
      auditPageSchema.parse(await (await callRoute(getAudit, { as: admin, path: `/?${query}` })).json());
    const all = await read('');
    expect(all.events.map(({ action }) => action)).toEqual(
      expect.arrayContaining(['project.created', 'api_token.created']),
    );
    const created = all.events.find(({ action }) => action === 'project.created');
    expect(created).toMatchObject({ who: '=cmd Admin', kind: 'token', details: { apiTokenId: id } });
    expect((await read('action=api_token')).events.map(({ action }) => action)).toEqual(['api_token.created']);
    expect((await read(`subjectId=${id}`)).events).toHaveLength(1);
    expect((await read('who=nobody')).events).toEqual([]);
    expect((await read('who=%25')).events).toEqual([]);
    expect((await read('to=2001-01-01')).events).toEqual([]);
    expect((await read(`from=${new Date().toISOString().slice(0, 10)}&who=cmd`)).events.length).toBeGreaterThan(1);
    const csv = await (await callRoute(getAuditCsv, { as: admin, path: '/?action=project.created' })).text();
    expect(csv.split('\r\n')[1]).toContain("'=cmd Admin");
  });

  it('turns pages without losing or repeating an event, however close they lie', async () => {
    const admin = await createMember('admin');
    const at = new Date('2026-11-30T10:00:00.123Z');
    const { organisationId } = admin;
    await AuditEvent.bulkCreate(
      Array.from({ length: 250 }, (_, index) => ({
        organisationId,
        action: 'thing.done',
        createdAt: at,
        details: { index },
      })),
    );
    const seen: unknown[] = [];
    let before = '';
    for (let page = 0; page < 3; page += 1) {
      const response = await callRoute(getAudit, { as: admin, path: `/?before=${before}` });
      const answer = auditPageSchema.parse(await response.json());
      seen.push(...answer.events.map(({ details }) => details.index));
      before = answer.next ?? '';
    }
    expect(before).toBe('');
    expect(new Set(seen).size).toBe(250);
    expect(seen).toHaveLength(250);
  });
});
