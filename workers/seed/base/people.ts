import type { Role } from '@/lib/contracts/common';

export interface Person {
  role: Role;
  name: string;
  email: string;
}

/** All invented. */
export const BRACKWATER = {
  name: 'Brackwater Integration',
  people: {
    planner: { role: 'planner', name: 'Ilse Varnholt', email: 'planner@brackwater.example' },
    integrator: { role: 'integrator', name: 'Joren Addlestane', email: 'integrator@brackwater.example' },
    admin: { role: 'admin', name: 'Maren Oxbury', email: 'admin@brackwater.example' },
    viewer: { role: 'viewer', name: 'Petra Quillfen', email: 'viewer@quillfen.example' },
  },
} as const satisfies { name: string; people: Record<string, Person> };

export const OSTERLODE = {
  name: 'Osterlode Fixtures',
  people: {
    integrator: { role: 'integrator', name: 'Teodor Lindwey', email: 'planner@osterlode.example' },
  },
} as const satisfies { name: string; people: Record<string, Person> };

/** The one project that the customer's account may look at. */
export const VIEWER_PROJECT = 'Pump housing line, bay 4';
