import { beforeAll, describe, expect, it } from 'vitest';
import { GET, PATCH } from '@/app/api/projects/[projectId]/route';
import { GET as list, POST } from '@/app/api/projects/route';
import { problemSchema } from '@/lib/contracts/common';
import { projectListSchema, projectSchema, type Project } from '@/lib/contracts/projects';
import { Layout, Project as ProjectRow } from '@/models';
import {
  callRoute,
  createLayout,
  createMember,
  createProject,
  createRemark,
  createRevision,
  type TestMember,
} from '@/tests/factories';

let planner: TestMember;
beforeAll(async () => {
  planner = await createMember('planner');
});

async function projectsOf(as: TestMember, query = ''): Promise<Project[]> {
  const response = await callRoute(list, { as, path: `/api/projects${query}` });
  return projectListSchema.parse(await response.json()).projects;
}

async function newProject(as: TestMember, body: object): Promise<Project> {
  const response = await callRoute(POST, { as, method: 'POST', body });
  expect(response.status).toBe(201);
  return projectSchema.parse(await response.json());
}

const change = (as: TestMember, projectId: string, body: object) =>
  callRoute(PATCH, { as, method: 'PATCH', params: { projectId }, body });

describe('a project', () => {
  it('is created with customer and site, and read back', async () => {
    const body = { name: ' Pump line ', customerName: 'Quillfen Pumps', siteName: 'Hall 2' };
    const project = await newProject(planner, body);
    expect(project).toMatchObject({ ...body, name: 'Pump line', archivedAt: null, layoutCount: 0, openRemarkCount: 0 });
    const read = await callRoute(GET, { as: planner, params: { projectId: project.id } });
    expect(projectSchema.parse(await read.json())).toEqual(project);
  });

  it('needs a name', async () => {
    const response = await callRoute(POST, { as: planner, method: 'POST', body: { name: '  ' } });
    expect(response.status).toBe(422);
    expect(problemSchema.parse(await response.json()).errors).toEqual([
      { path: 'name', message: 'Give the project a name.' },
    ]);
  });

  it('keeps what a change leaves out', async () => {
    const { id } = await newProject(planner, { name: 'Line 1', customerName: 'Quillfen Pumps', siteName: 'Hall 2' });
    const changed = projectSchema.parse(await (await change(planner, id, { name: 'Line 2' })).json());
    expect(changed).toMatchObject({ name: 'Line 2', customerName: 'Quillfen Pumps', siteName: 'Hall 2' });
  });

  it('counts its variants and the remarks still open', async () => {
    const { id } = await newProject(planner, { name: 'Counted' });
    const layout = await createLayout({ projectId: id });
    await createLayout({ projectId: id });
    const revision = await createRevision({ layoutId: layout.id });
    await createRemark({ revisionId: revision.id });
    await (await createRemark({ revisionId: revision.id })).update({ resolvedAt: new Date() });
    const [project] = (await projectsOf(planner)).filter((candidate) => candidate.id === id);
    expect(project).toMatchObject({ layoutCount: 2, openRemarkCount: 1 });
  });
});

describe('the list of projects', () => {
  it('leaves archived ones out, shows them when asked, and takes them back', async () => {
    const { id } = await newProject(planner, { name: 'Finished line' });
    const ids = async (query = '') => (await projectsOf(planner, query)).map((project) => project.id);

    const archived = projectSchema.parse(await (await change(planner, id, { archived: true })).json());
    expect(archived.archivedAt).not.toBeNull();
    expect(await ids()).not.toContain(id);
    expect(await ids('?archived=true')).toContain(id);
    const again = projectSchema.parse(await (await change(planner, id, { archived: true })).json());
    expect(again.archivedAt).toBe(archived.archivedAt);

    await change(planner, id, { archived: false });
    expect(await ids()).toContain(id);
    expect(await ids('?archived=true')).not.toContain(id);
  });

  it('finds what is typed in name, customer and site, as text and not as a pattern', async () => {
    const as = await createMember('planner');
    await newProject(as, { name: 'Valve cell 100%', customerName: 'Quillfen Pumps', siteName: 'North_yard' });
    await newProject(as, { name: 'Gear cell', customerName: 'Osterlode', siteName: 'NorthXyard' });
    const found = async (search: string) =>
      (await projectsOf(as, `?search=${encodeURIComponent(search)}`)).map(({ name }) => name).sort();
    expect(await found('vALVE')).toEqual(['Valve cell 100%']);
    expect(await found('quillfen')).toEqual(['Valve cell 100%']);
    expect(await found('north_y')).toEqual(['Valve cell 100%']);
    expect(await found('%')).toEqual(['Valve cell 100%']);
    expect(await found('cell')).toEqual(['Gear cell', 'Valve cell 100%']);
    expect(await found("'; DROP TABLE projects; --")).toEqual([]);
  });

  it('starts with the one that was worked on last', async () => {
    const as = await createMember('planner');
    const first = await newProject(as, { name: 'First' });
    const second = await newProject(as, { name: 'Second' });
    expect((await projectsOf(as)).map(({ id }) => id)).toEqual([second.id, first.id]);
    const layout = await createLayout({ projectId: first.id });
    const projects = await projectsOf(as);
    expect(projects.map(({ id }) => id)).toEqual([first.id, second.id]);
    const { updatedAt } = await Layout.findByPk(layout.id, { rejectOnEmpty: true });
    expect(projects[0].updatedAt).toBe(updatedAt.toISOString());
  });
});

describe('who may see a project', () => {
  it('is its organisation alone', async () => {
    const stranger = await createMember('admin');
    const { id } = await newProject(planner, { name: 'Ours' });
    expect((await projectsOf(stranger)).map((project) => project.id)).not.toContain(id);
    expect((await callRoute(GET, { as: stranger, params: { projectId: id } })).status).toBe(404);
    expect((await change(stranger, id, { name: 'Theirs' })).status).toBe(404);
    expect((await ProjectRow.findByPk(id, { rejectOnEmpty: true })).name).toBe('Ours');
  });

  it('is, of viewers, those it was named to; they see what was issued and change nothing', async () => {
    const mine = await createProject({ organisationId: planner.organisationId });
    const other = await createProject({ organisationId: planner.organisationId });
    const viewer = await createMember('viewer', { organisationId: planner.organisationId, projectIds: [mine.id] });
    const issued = await createLayout({ projectId: mine.id });
    await createLayout({ projectId: mine.id });
    await createRevision({ layoutId: issued.id });

    const projects = await projectsOf(viewer);
    expect(projects.map(({ id }) => id)).toEqual([mine.id]);
    expect(projects[0].layoutCount).toBe(1);
    expect((await callRoute(GET, { as: viewer, params: { projectId: other.id } })).status).toBe(404);
    expect((await change(viewer, mine.id, { name: 'Mine' })).status).toBe(403);
    expect((await callRoute(POST, { as: viewer, method: 'POST', body: { name: 'New' } })).status).toBe(403);
  });
});
