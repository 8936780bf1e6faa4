import type { Account } from '@/lib/contracts/accounts';
import { Organisation } from '@/models';
import type { MemberActor } from '../policy';
import { presentAccount } from './present';

export async function getAccount(actor: MemberActor): Promise<Account> {
  const organisation = await Organisation.findByPk(actor.organisationId, { rejectOnEmpty: true });
  return presentAccount(actor, organisation);
}
