import { beforeAll, describe, expect, it } from 'vitest';
import { DELETE } from '@/app/api/comparisons/[comparisonId]/route';
import { GET, POST } from '@/app/api/projects/[projectId]/comparisons/route';
import { comparisonListSchema, comparisonSchema } from '@/lib/contracts/comparisons';
import {
  callRoute,
  createLayout,
  createMember,
  createProject,
  createRevision,
  type TestMember,
} from '@/tests/factories';

let planner: TestMember;
let viewer: TestMember;
let projectId: string;
let draft: string;
let issued: string[];

beforeAll(async () => {
  planner = await createMember('planner');
  const { organisationId } = planner;
  projectId = (await createProject({ organisationId })).id;
  viewer = await createMember('viewer', { organisationId, projectIds: [projectId] });
  const layout = await createLayout({ projectId });
  draft = `layout:${layout.id}`;
  issued = [];
  for (let count = 0; count < 2; count++) issued.push(`revision:${(await createRevision({ layoutId: layout.id })).id}`);
});

const view = { measure: 'sureSpeed', wrist: 'free' };
const keep = (sheets: string[], name = 'B against C') =>
  callRoute(POST, { as: planner, method: 'POST', params: { projectId }, body: { name, sheets, view } });
async function listFor(as: TestMember): Promise<string[]> {
  const response = await callRoute(GET, { as, params: { projectId } });
  return comparisonListSchema.parse(await response.json()).comparisons.map(({ name }) => name);
}

describe('a comparison', () => {
  it('is kept with its sheets in their order and its question, and taken away again', async () => {
    const response = await keep([issued[1], draft, issued[0]], 'Three of A');
    expect(response.status).toBe(201);
    const kept = comparisonSchema.parse(await response.json());
    expect(kept).toMatchObject({ sheets: [issued[1], draft, issued[0]], view, createdBy: planner.user.name });
    expect(await listFor(planner)).toContain('Three of A');
    await callRoute(DELETE, { as: planner, method: 'DELETE', params: { comparisonId: kept.id } });
    expect(await listFor(planner)).not.toContain('Three of A');
  });

  it('shows viewers nothing of drafts', async () => {
    await keep([issued[0], draft], 'With the draft');
    await keep(issued, 'Of revisions');
    expect(await listFor(viewer)).toEqual(['Of revisions']);
    expect((await listFor(planner)).sort()).toEqual(['Of revisions', 'With the draft']);
  });

  it('is refused for a sheet of another project, for one sheet twice, and for five', async () => {
    const foreign = `layout:${(await createLayout()).id}`;
    for (const sheets of [[draft, foreign], [draft, draft], [draft], [draft, ...issued, ...issued]]) {
      expect((await keep(sheets)).status, sheets.join(' ')).toBe(422);
    }
  });
});
