import type { Role } from '@/lib/contracts/common';

export const ROLE_NAMES: Record<Role, string> = {
  viewer: 'Viewer',
  planner: 'Planner',
  integrator: 'Integrator',
  admin: 'Admin',
};

/** What each role may do, in one line. */
export const ROLE_DEEDS: Record<Role, string> = {
  viewer: 'looks at issued revisions of named projects and pins remarks to them.',
  planner: 'draws layouts, asks for maps, answers remarks.',
  integrator: 'all a planner does, and keeps the arms, issues revisions, shares links.',
  admin: 'all of it, and members, roles and settings.',
};

export const ROLES_IN_ORDER: readonly Role[] = ['viewer', 'planner', 'integrator', 'admin'];
