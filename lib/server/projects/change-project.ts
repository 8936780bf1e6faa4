import type { Transaction } from 'sequelize';
import type { Project as ProjectAnswer, ProjectChange } from '@/lib/contracts/projects';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import type { MemberActor } from '../policy';
import { findCountedProject, findProject } from './data';
import { presentProject } from './present';

/** Renames a project, archives it or brings it back. A project archived twice keeps its first date. */
export async function changeProject(
  actor: MemberActor,
  projectId: string,
  { archived, ...names }: ProjectChange,
  outer?: Transaction,
): Promise<ProjectAnswer> {
  return inTransaction(async (transaction) => {
    const project = await findProject(actor, projectId, transaction, { lock: true });
    const archivedAt =
      archived === undefined ? project.archivedAt : archived ? (project.archivedAt ?? new Date()) : null;
    const action = archived === undefined ? 'project.changed' : archived ? 'project.archived' : 'project.brought_back';
    await project.update({ ...names, archivedAt }, { transaction });
    await recordAudit(actor, { action, subjectId: projectId, details: { ...names } }, transaction);
    return presentProject(await findCountedProject(actor, projectId, transaction));
  }, outer);
}
