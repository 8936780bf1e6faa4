import type { Account } from '@/lib/contracts/accounts';
import type { Organisation } from '@/models';
import type { MemberActor } from '../policy';

export function presentAccount(actor: MemberActor, organisation: Organisation): Account {
  return {
    id: actor.userId,
    name: actor.name,
    email: actor.email,
    role: actor.role,
    organisation: { id: organisation.id, name: organisation.name },
  };
}
