import type { Role } from '@/lib/contracts/common';

export interface Section {
  href: string;
  name: string;
}

const PROJECTS: Section = { href: '/projects', name: 'Projects' };
const ARMS: Section = { href: '/arms', name: 'Arms' };
const MEMBERS: Section = { href: '/members', name: 'Members' };
const AUDIT: Section = { href: '/audit', name: 'Audit' };

/** The pages a role has something to do on. */
export function sectionsFor(role: Role): readonly Section[] {
  if (role === 'viewer') return [PROJECTS];
  return role === 'admin' ? [PROJECTS, ARMS, MEMBERS, AUDIT] : [PROJECTS, ARMS];
}
