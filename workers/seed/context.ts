import type { MemberActor } from '@/lib/server/policy';

/** The people for whom the seed acts: whatever it makes, it makes as one of them and by the same functions as the product. */
export interface SeedContext {
  /** Brackwater Integration. The viewer is Quillfen's, limited to one project once that exists. */
  brackwater: {
    organisationId: string;
    planner: MemberActor;
    integrator: MemberActor;
    admin: MemberActor;
    viewer: MemberActor;
  };
  /** Osterlode Fixtures, there to show that two organisations never see each other. */
  osterlode: { organisationId: string; integrator: MemberActor };
}
