import type { Transaction } from 'sequelize';
import type { Remark as RemarkAnswer } from '@/lib/contracts/remarks';
import { findLayout } from '../layouts/data';
import { findProject } from '../projects/data';
import { findRevision } from '../revisions/data';
import type { Reader } from './author';
import { listRemarks } from './data';
import { presentRemark } from './present';

/** Of every variant of the project, for its table of remarks. */
export async function readProjectRemarks(
  reader: Reader,
  projectId: string,
  transaction?: Transaction,
): Promise<RemarkAnswer[]> {
  await findProject(reader.actor, projectId, transaction);
  return (await listRemarks(reader.actor, { projectId }, transaction)).map((remark) => presentRemark(remark, reader));
}

/** On every revision of the layout. */
export async function readLayoutRemarks(
  reader: Reader,
  layoutId: string,
  transaction?: Transaction,
): Promise<RemarkAnswer[]> {
  await findLayout(reader.actor, layoutId, transaction);
  return (await listRemarks(reader.actor, { layoutId }, transaction)).map((remark) => presentRemark(remark, reader));
}

/** Those pinned to the revision, and those carried forward to it. */
export async function readRevisionRemarks(
  reader: Reader,
  revisionId: string,
  transaction?: Transaction,
): Promise<RemarkAnswer[]> {
  await findRevision(reader.actor, revisionId, transaction);
  return (await listRemarks(reader.actor, { revisionId }, transaction)).map((remark) => presentRemark(remark, reader));
}
