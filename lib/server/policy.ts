import type { WhereOptions } from 'sequelize';
import type { Role } from '@/lib/contracts/common';
import type { Project } from '@/models';
import { forbidden } from './errors';

/** A signed-in person, as the database has them at this request. */
export interface MemberActor {
  kind: 'member';
  userId: string;
  membershipId: string;
  organisationId: string;
  role: Role;
  name: string;
  email: string;
  /** The projects a viewer may look at; null for every other role, which sees all of its organisation. */
  projectIds: string[] | null;
  /** Set where a program acts for them, under one of their API tokens. */
  apiToken?: { id: string; readOnly: boolean };
}

/** Somebody who came by a share link: one revision of one project, and nothing else. */
export interface ShareActor {
  kind: 'share';
  shareLinkId: string;
  organisationId: string;
  projectId: string;
  revisionId: string;
  mayRemark: boolean;
  maySign: boolean;
}

export type Actor = MemberActor | ShareActor;

const ROLE_ORDER: readonly Role[] = ['viewer', 'planner', 'integrator', 'admin'];

export function roleIsAtLeast(role: Role, least: Role): boolean {
  return ROLE_ORDER.indexOf(role) >= ROLE_ORDER.indexOf(least);
}

/** The lesser of two roles. */
export function lesserRole(one: Role, other: Role): Role {
  return roleIsAtLeast(one, other) ? other : one;
}

/** True for a member of at least that role; never for a share link. */
export function actsAs(actor: Actor, least: Role): actor is MemberActor {
  return actor.kind === 'member' && roleIsAtLeast(actor.role, least);
}

/** Throws 403 unless the actor is a member of at least that role. */
export function demandRole(actor: Actor, least: Role): asserts actor is MemberActor {
  if (!actsAs(actor, least)) throw forbidden();
}

/** Viewers and share links see a project only through its issued revisions. */
export function seesDrafts(actor: Actor): actor is MemberActor {
  return actsAs(actor, 'planner');
}

/** The part of a query on projects that keeps it within what the actor may see. Every query on a project's parts starts here. */
export function projectScope(actor: Actor): WhereOptions<Project> {
  if (actor.kind === 'share') return { organisationId: actor.organisationId, id: actor.projectId };
  if (actor.projectIds) return { organisationId: actor.organisationId, id: actor.projectIds };
  return { organisationId: actor.organisationId };
}
