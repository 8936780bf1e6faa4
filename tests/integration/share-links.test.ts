import { beforeAll, describe, expect, it } from 'vitest';
import sharp from 'sharp';
import { POST as uploadPlan } from '@/app/api/projects/[projectId]/floor-plans/route';
import { GET as listLinks, POST as createLink } from '@/app/api/revisions/[revisionId]/share-links/route';
import { GET as open } from '@/app/api/share/[token]/route';
import { GET as sharedMap } from '@/app/api/share/[token]/maps/[mapId]/route';
import { GET as sharedTiles } from '@/app/api/share/[token]/maps/[mapId]/tiles/route';
import { GET as sharedPicture } from '@/app/api/share/[token]/picture/route';
import { GET as sharedRemarks } from '@/app/api/share/[token]/remarks/route';
import { DELETE as revoke } from '@/app/api/share-links/[shareLinkId]/route';
import { floorPlanSchema } from '@/lib/contracts/floor-plans';
import {
  newShareLinkSchema,
  sharedRevisionSchema,
  shareLinkListSchema,
  shareLinkSchema,
} from '@/lib/contracts/share-links';
import { env } from '@/lib/server/env';
import { randomToken } from '@/lib/server/tokens';
import { Layout, Organisation, Revision, ShareLink } from '@/models';
import {
  callRoute,
  createLayout,
  createMap,
  createMember,
  createProject,
  createRevision,
  createShareLink,
  emptySnapshot,
  type TestMember,
  type Handler,
} from '@/tests/factories';
import { upload } from './support/upload';

let integrator: TestMember;
let projectId: string;
let revisionId: string;

beforeAll(async () => {
  integrator = await createMember('integrator');
  projectId = (await createProject({ organisationId: integrator.organisationId })).id;
  revisionId = (await createRevision({ layoutId: (await createLayout({ projectId })).id })).id;
});

const visit = (handler: Handler, token: string, params: object = {}, path = '/') =>
  callRoute(handler, { params: { token, ...params }, path });

describe('a share link', () => {
  it('is made for a revision; its address opens it and is told only once', async () => {
    const response = await callRoute(createLink, {
      as: integrator,
      method: 'POST',
      params: { revisionId },
      body: { label: 'Maintenance', expiresInDays: 7 },
    });
    expect(response.status).toBe(201);
    const { url, ...link } = newShareLinkSchema.parse(await response.json());
    expect(link).toMatchObject({ revisionId, label: 'Maintenance', mayRemark: true, openCount: 0, revokedAt: null });
    const days = (Date.parse(link.expiresAt) - Date.parse(link.createdAt)) / (24 * 3600 * 1000);
    expect(days).toBeCloseTo(7, 1);

    expect(url.startsWith(`${env.APP_URL}/share/`)).toBe(true);
    const token = url.slice(url.lastIndexOf('/') + 1);
    expect(Buffer.from(token, 'base64url')).toHaveLength(32);
    const shared = sharedRevisionSchema.parse(await (await visit(open, token)).json());
    const organisation = await Organisation.findByPk(integrator.organisationId, { rejectOnEmpty: true });
    expect(shared).toMatchObject({ organisationName: organisation.name, mayRemark: true, expiresAt: link.expiresAt });
    expect(shared.revision.id).toBe(revisionId);

    const row = await ShareLink.findByPk(link.id, { rejectOnEmpty: true });
    expect(JSON.stringify(row)).not.toContain(token);
    const listed = await callRoute(listLinks, { as: integrator, params: { revisionId } });
    const text = await listed.text();
    expect(text).not.toContain(token);
    const { shareLinks } = shareLinkListSchema.parse(JSON.parse(text));
    expect(shareLinks[0]).toMatchObject({ id: link.id, openCount: 1 });
    expect(shareLinks[0].lastOpenedAt).not.toBeNull();
  });

  it('counts every opening, those at the same moment too', async () => {
    const { shareLink, token } = await createShareLink({ revisionId });
    await Promise.all(Array.from({ length: 5 }, () => visit(open, token)));
    await shareLink.reload();
    expect(shareLink.openCount).toBe(5);
  });

  it('that is unknown, malformed, expired or revoked leads nowhere, and says the same each time', async () => {
    const expired = await createShareLink({ revisionId, expiresAt: new Date(Date.now() - 1000) });
    const revoked = await createShareLink({ revisionId, revokedAt: new Date() });
    const details = new Set<string>();
    for (const token of [randomToken(), expired.token, revoked.token]) {
      for (const handler of [open, sharedPicture, sharedRemarks]) {
        const response = await visit(handler, token);
        expect(response.status).toBe(404);
        details.add(((await response.json()) as { detail: string }).detail);
      }
    }
    expect(details.size).toBe(1);
    for (const token of ['', 'short', `${randomToken()}x`, "' OR true --"]) {
      expect((await visit(open, token)).status).toBe(404);
    }
  });

  it('is revoked at once, and a second time changes nothing', async () => {
    const { shareLink, token } = await createShareLink({ revisionId });
    const end = async () => {
      const options = { as: integrator, method: 'DELETE', params: { shareLinkId: shareLink.id } };
      return shareLinkSchema.parse(await (await callRoute(revoke, options)).json());
    };
    expect((await visit(open, token)).status).toBe(200);
    const first = await end();
    expect(first.revokedAt).not.toBeNull();
    expect((await visit(open, token)).status).toBe(404);
    expect((await end()).revokedAt).toBe(first.revokedAt);
  });

  it('keeps its answers, refusals included, out of caches, referrers and search engines', async () => {
    const { token } = await createShareLink({ revisionId });
    for (const response of [
      await visit(open, token),
      await visit(open, randomToken()),
      await visit(sharedRemarks, token),
    ]) {
      expect(response.headers.get('cache-control')).toBe('no-store');
      expect(response.headers.get('referrer-policy')).toBe('no-referrer');
      expect(response.headers.get('x-robots-tag')).toContain('noindex');
    }
  });
});

describe('under a share link', () => {
  it('lie the picture and the maps of its revision and no others', async () => {
    const bytes = await sharp({ create: { width: 1500, height: 900, channels: 3, background: 'white' } })
      .png()
      .toBuffer();
    const uploaded = await upload(uploadPlan, { as: integrator, projectId, file: { name: 'hall.png', bytes } });
    const floorPlan = floorPlanSchema.parse(await uploaded.json());
    const named = await createMap({ organisationId: integrator.organisationId });
    const other = await createMap({ organisationId: integrator.organisationId });
    const layout = await createLayout({ projectId });
    const { snapshot, sha256 } = emptySnapshot(layout);
    const maps = [{ robotId: layout.id, mapId: named.id, key: named.key }];
    const revision = await Revision.create({
      layoutId: layout.id,
      number: 1,
      snapshot: { ...snapshot, floorPlan, maps },
      sha256,
    });
    const { token } = await createShareLink({ revisionId: revision.id });

    const picture = await visit(sharedPicture, token, {}, '/?width=600');
    expect(picture.status).toBe(200);
    expect(picture.headers.get('cache-control')).toBe('no-store');
    expect((await sharp(Buffer.from(await picture.arrayBuffer())).metadata()).width).toBe(1024);
    expect((await visit(sharedMap, token, { mapId: named.id })).status).toBe(200);
    expect((await visit(sharedMap, token, { mapId: other.id })).status).toBe(404);
    expect((await visit(sharedTiles, token, { mapId: other.id })).status).toBe(404);
    // Named, but nobody has computed it yet.
    expect((await visit(sharedTiles, token, { mapId: named.id })).status).toBe(409);

    const bare = await createShareLink({ revisionId });
    expect((await visit(sharedPicture, bare.token)).status).toBe(404);
    expect((await visit(sharedMap, bare.token, { mapId: named.id })).status).toBe(404);
  });

  it('the revision stays as it was issued', async () => {
    const layout = await createLayout({ projectId });
    const revision = await createRevision({ layoutId: layout.id });
    const { token } = await createShareLink({ revisionId: revision.id });
    await Layout.update({ name: 'Something else' }, { where: { id: layout.id } });
    await createRevision({ layoutId: layout.id });
    const shared = sharedRevisionSchema.parse(await (await visit(open, token)).json());
    expect(shared.revision).toMatchObject({ number: 1, snapshot: { name: layout.name } });
  });
});

describe('who may make, see and end links', () => {
  it('is the integrators of the organisation; planners see them', async () => {
    const organisationId = integrator.organisationId;
    const planner = await createMember('planner', { organisationId });
    const viewer = await createMember('viewer', { organisationId, projectIds: [projectId] });
    const stranger = await createMember('admin');
    const { shareLink } = await createShareLink({ revisionId });
    const statuses = async (as: TestMember) => {
      const make = { as, method: 'POST', params: { revisionId }, body: {} };
      const end = { as, method: 'DELETE', params: { shareLinkId: shareLink.id } };
      return [
        (await callRoute(createLink, make)).status,
        (await callRoute(listLinks, { as, params: { revisionId } })).status,
        (await callRoute(revoke, end)).status,
      ];
    };
    expect(await statuses(planner)).toEqual([403, 200, 403]);
    expect(await statuses(viewer)).toEqual([403, 403, 403]);
    expect(await statuses(stranger)).toEqual([404, 404, 404]);
    await shareLink.reload();
    expect(shareLink.revokedAt).toBeNull();
  });
});
