import type { Transaction } from 'sequelize';
import { Project } from '@/models';
import type { Project as ProjectAnswer, ProjectRequest } from '@/lib/contracts/projects';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import type { MemberActor } from '../policy';
import { findCountedProject } from './data';
import { presentProject } from './present';

export async function createProject(
  actor: MemberActor,
  request: ProjectRequest,
  outer?: Transaction,
): Promise<ProjectAnswer> {
  return inTransaction(async (transaction) => {
    const { id } = await Project.create(
      { ...request, organisationId: actor.organisationId, createdBy: actor.userId },
      { transaction },
    );
    await recordAudit(
      actor,
      { action: 'project.created', subjectId: id, details: { name: request.name } },
      transaction,
    );
    return presentProject(await findCountedProject(actor, id, transaction));
  }, outer);
}
