import type { Transaction } from 'sequelize';
import type { ReportedSheet, ReportInput, ReportRequest } from '@/lib/contracts/reports';
import { Organisation, Project } from '@/models';
import { invalid } from '../errors';
import { handedSheet, type HandedSheet } from '../exports/subject';
import type { MemberActor } from '../policy';

/** All that a report will say, frozen: a later edit changes nothing about a report that was asked for before. */
export async function reportInput(
  actor: MemberActor,
  { subject, subjectId, options }: ReportRequest,
  transaction: Transaction,
): Promise<{ handed: HandedSheet; input: ReportInput }> {
  const handed = await handedSheet(actor, subject, subjectId, transaction);
  const project = await Project.findByPk(handed.projectId, { rejectOnEmpty: true, transaction });
  const organisation = await Organisation.findByPk(actor.organisationId, { rejectOnEmpty: true, transaction });
  const { compareWith } = options;
  const other = compareWith && (await handedSheet(actor, compareWith.subject, compareWith.subjectId, transaction));
  if (other && other.projectId !== handed.projectId) {
    throw invalid('options.compareWith', 'This sheet is not in the same project. Choose another one to compare with.');
  }
  return {
    handed,
    input: {
      organisationName: organisation.name,
      askedBy: actor.name,
      askedAt: new Date().toISOString(),
      sheet: reported(handed, project.siteName),
      compared: other && reported(other, project.siteName),
      signatures: signaturesOf(handed),
    },
  };
}

function reported({ snapshot, revision }: HandedSheet, siteName: string): ReportedSheet {
  if (!revision) return { snapshot, siteName, revision: null };
  const { id, number, state, note, sha256, issuedAt, issuedBy } = revision;
  return { snapshot, siteName, revision: { id, number, state, note, sha256, issuedAt, issuedBy } };
}

function signaturesOf({ revision }: HandedSheet): ReportInput['signatures'] {
  const signOffs = revision?.signOffs ?? [];
  return signOffs.map(({ decision, name, note, sha256, signedAt }) => ({ decision, name, note, sha256, signedAt }));
}
