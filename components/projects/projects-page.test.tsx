import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { Project } from '@/lib/contracts/projects';
import { api, problem, withApi } from '@/tests/components/api';
import { fakeProject } from '@/tests/components/fakes';
import { show } from '@/tests/components/show';
import { ProjectsPage } from './projects-page';

const router = { push: vi.fn() };
vi.mock('next/navigation', () => ({ useRouter: () => router }));

withApi();

const PROJECTS = [
  fakeProject(1, { name: 'Pump housing line, bay 4', openRemarkCount: 2 }),
  fakeProject(2, { name: 'Gearbox cell', customerName: 'Tarn Hollow Drives' }),
  fakeProject(3, { name: 'Cell 10', siteName: 'Hall 9' }),
  fakeProject(4, { name: 'Cell 9' }),
];

/** A server that keeps projects and searches them as the real one does. */
function keep(projects: Project[]): { queries: URLSearchParams[]; bodies: unknown[] } {
  const queries: URLSearchParams[] = [];
  const bodies: unknown[] = [];
  api.use(
    http.get('/api/projects', ({ request }) => {
      const query = new URL(request.url).searchParams;
      queries.push(query);
      const search = (query.get('search') ?? '').toLowerCase();
      const archived = query.get('archived') === 'true';
      return HttpResponse.json({
        projects: projects.filter(
          (project) => (project.archivedAt !== null) === archived && project.name.toLowerCase().includes(search),
        ),
      });
    }),
    http.patch('/api/projects/:projectId', async ({ request, params }) => {
      const change = (await request.json()) as { archived: boolean };
      bodies.push(change);
      const index = projects.findIndex((project) => project.id === params.projectId);
      projects[index] = { ...projects[index], archivedAt: change.archived ? new Date().toISOString() : null };
      return HttpResponse.json(projects[index]);
    }),
  );
  return { queries, bodies };
}

const names = (): (string | null)[] =>
  screen.getAllByRole('link', { name: /cell|pump/i }).map((link) => link.textContent);

describe('ProjectsPage', () => {
  beforeEach(() => vi.clearAllMocks());

  it('lists the projects, the last edited first, and sorts by any head in the way people count', async () => {
    keep([...PROJECTS]);
    const { user } = show(<ProjectsPage />);
    await screen.findByRole('link', { name: 'Gearbox cell' });
    expect(names()).toEqual(['Pump housing line, bay 4', 'Gearbox cell', 'Cell 10', 'Cell 9']);

    await user.click(screen.getByRole('button', { name: 'Project' }));
    expect(names()).toEqual(['Cell 9', 'Cell 10', 'Gearbox cell', 'Pump housing line, bay 4']);
    expect(screen.getByRole('columnheader', { name: 'Project' })).toHaveAttribute('aria-sort', 'ascending');

    await user.click(screen.getByRole('button', { name: 'Project' }));
    expect(names()[0]).toBe('Pump housing line, bay 4');
  });

  it('keeps empty cells at the end whichever way it sorts', async () => {
    keep([...PROJECTS]);
    const { user } = show(<ProjectsPage />);
    await screen.findByRole('link', { name: 'Cell 10' });
    const head = screen.getByRole('button', { name: 'Site' });
    await user.click(head);
    expect(names()[0]).toBe('Cell 10');
    await user.click(head);
    expect(names()[0]).toBe('Cell 10');
  });

  it('asks the server for what is searched, and offers the way back when nothing matches', async () => {
    const { queries } = keep([...PROJECTS]);
    const { user } = show(<ProjectsPage />);
    await screen.findByRole('link', { name: 'Cell 10' });
    await user.type(screen.getByRole('searchbox', { name: 'Search projects' }), 'gear');
    await waitFor(() => expect(names()).toEqual(['Gearbox cell']));
    expect(queries.at(-1)?.get('search')).toBe('gear');

    await user.type(screen.getByRole('searchbox', { name: 'Search projects' }), 'wheel');
    expect(await screen.findByText('No project matches “gearwheel”')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Clear the search' }));
    expect(await screen.findByRole('link', { name: 'Cell 10' })).toBeVisible();
  });

  it('puts a project into the archive and takes it out again', async () => {
    const { bodies } = keep([...PROJECTS]);
    const { user } = show(<ProjectsPage />);
    await user.click(await screen.findByRole('button', { name: 'More for Gearbox cell' }));
    await user.click(await screen.findByRole('menuitem', { name: 'Archive' }));
    await waitFor(() => expect(screen.queryByRole('link', { name: 'Gearbox cell' })).toBeNull());

    await user.click(screen.getByRole('radio', { name: 'Archived' }));
    await user.click(await screen.findByRole('button', { name: 'More for Gearbox cell' }));
    await user.click(await screen.findByRole('menuitem', { name: 'Bring back from the archive' }));
    expect(await screen.findByText('Nothing is archived')).toBeVisible();
    expect(bodies).toEqual([{ archived: true }, { archived: false }]);
  });

  it('says the next step where there is no project', async () => {
    keep([]);
    const { user } = show(<ProjectsPage />);
    expect(await screen.findByText(/then upload the floor plan and set it to scale/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Create the first project' }));
    expect(await screen.findByRole('dialog', { name: 'New project' })).toBeVisible();
  });

  it('gives a viewer no buttons that are not theirs', async () => {
    keep([...PROJECTS]);
    show(<ProjectsPage />, 'viewer');
    await screen.findByRole('link', { name: 'Gearbox cell' });
    expect(screen.queryByRole('button', { name: /New project|More for/ })).toBeNull();
    expect(screen.queryByRole('link', { name: 'Arms' })).toBeNull();
  });

  it('says why there is no list, and tries again', async () => {
    let fails = true;
    api.use(
      http.get('/api/projects', () =>
        fails ? problem(500, 'internal', 'Something broke on the server.') : HttpResponse.json({ projects: PROJECTS }),
      ),
    );
    const { user } = show(<ProjectsPage />);
    expect(await screen.findByText('Something broke on the server.')).toBeVisible();
    fails = false;
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('link', { name: 'Gearbox cell' })).toBeVisible();
  });

  it('keeps what was typed when the server refuses a new project, and opens it when it does not', async () => {
    keep([...PROJECTS]);
    const taken = 'There is a project of this name. Choose another one.';
    const asked: unknown[] = [];
    api.use(
      http.post('/api/projects', async ({ request }) => {
        const body = (await request.json()) as { name: string };
        asked.push(body);
        if (body.name === 'Gearbox cell') return problem(422, 'invalid', taken, [{ path: 'name', message: taken }]);
        return HttpResponse.json(fakeProject(9, { name: body.name }), { status: 201 });
      }),
    );
    const { user } = show(<ProjectsPage />);
    await user.click(await screen.findByRole('button', { name: 'New project' }));
    const dialog = within(await screen.findByRole('dialog'));
    await user.click(dialog.getByRole('button', { name: 'Create project' }));
    expect(await dialog.findByText('Give the project a name.')).toBeVisible();
    expect(asked).toHaveLength(0);

    await user.type(dialog.getByLabelText('Project'), 'Gearbox cell');
    await user.type(dialog.getByLabelText('Customer'), 'Tarn Hollow Drives');
    await user.click(dialog.getByRole('button', { name: 'Create project' }));
    expect(await dialog.findByText(taken)).toBeVisible();
    expect(dialog.getByLabelText('Customer')).toHaveValue('Tarn Hollow Drives');

    await user.type(dialog.getByLabelText('Project'), ' 2');
    await user.click(dialog.getByRole('button', { name: 'Create project' }));
    await waitFor(() => expect(router.push).toHaveBeenCalledWith(`/projects/${fakeProject(9).id}`));
    expect(asked.at(-1)).toEqual({ name: 'Gearbox cell 2', customerName: 'Tarn Hollow Drives', siteName: '' });
  });
});
