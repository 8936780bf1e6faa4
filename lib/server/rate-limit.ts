import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { tooManyRequests } from './errors';
import { sequelize } from './database';
import { hashToken } from './tokens';

/** Counters live in PostgreSQL, so all web processes count together. */
function limiter(keyPrefix: string, points: number, durationS: number): RateLimiterPostgres {
  return new RateLimiterPostgres({
    storeClient: sequelize,
    storeType: 'sequelize',
    tableName: 'rate_limits',
    tableCreated: true,
    keyPrefix,
    points,
    duration: durationS,
  });
}

const QUARTER_HOUR_S = 15 * 60;
const HOUR_S = 3600;

/** Addresses of people are counted under their hash: the table tells nobody who tried. */
const personKey = (email: string): string => hashToken(email).slice(0, 32);

/** Null while points are left, else the time until there are some again, seconds. */
async function consume(limit: RateLimiterPostgres, key: string): Promise<number | null> {
  try {
    await limit.consume(key);
    return null;
  } catch (refusal) {
    if (refusal instanceof RateLimiterRes) return refusal.msBeforeNext / 1000;
    throw refusal;
  }
}

const pair = limiter('sign_in_pair', 10, QUARTER_HOUR_S);
const account = limiter('sign_in_account', 100, HOUR_S);
const source = limiter('sign_in_source', 200, QUARTER_HOUR_S);

/**
 * Wrong passwords: 10 a quarter of an hour for one account from one address; the wider limits catch one account tried from
 * many addresses (100 an hour: high, because it also shuts its owner out) and many accounts tried from one.
 */
export const signInLimit = {
  async take(email: string, address: string): Promise<{ allowed: boolean; forgive: () => Promise<void> }> {
    const person = personKey(email);
    const pairKey = `${person}:${address}`;
    const waits = await Promise.all([consume(pair, pairKey), consume(account, person), consume(source, address)]);
    return {
      allowed: waits.every((wait) => wait === null),
      // A right password is no guess: it gives back what the try took.
      forgive: async () => {
        await Promise.all([pair.delete(pairKey), account.reward(person), source.reward(address)]);
      },
    };
  },
};

const resetByPerson = limiter('reset_person', 5, HOUR_S);
const resetBySource = limiter('reset_source', 30, HOUR_S);

/** False when this person has been sent enough mails for now; throws 429 when one source asks for many people. */
export async function takePasswordReset(email: string, address: string): Promise<boolean> {
  const wait = await consume(resetBySource, address);
  if (wait !== null) throw tooManyRequests('Too many requests from your network. Wait a while and try again.', wait);
  return (await consume(resetByPerson, personKey(email))) === null;
}

const linkBySource = limiter('link_source', 60, HOUR_S);

/** Throws 429 when one source tries many reset or invitation links. */
export async function takeLinkAttempt(address: string): Promise<void> {
  const wait = await consume(linkBySource, address);
  if (wait !== null) throw tooManyRequests('Too many tries from your network. Wait a while and try again.', wait);
}

const guestWrites = limiter('guest_write', 30, QUARTER_HOUR_S);

/** Throws 429 when guests of one share link write remarks faster than people do. */
export async function takeGuestWrite(shareLinkId: string): Promise<void> {
  const wait = await consume(guestWrites, shareLinkId);
  if (wait !== null)
    throw tooManyRequests('Many remarks came by this link just now. Wait a few minutes and send yours again.', wait);
}

/**
 * Network address of who asks. The last entry of X-Forwarded-For is the one the nearest server wrote; those before it are
 * whatever the client claims.
 */
export function clientAddress(headers: Headers | Record<string, unknown> | undefined): string {
  const raw = headers instanceof Headers ? headers.get('x-forwarded-for') : headers?.['x-forwarded-for'];
  const last = typeof raw === 'string' ? raw.split(',').at(-1)?.trim() : undefined;
  return last || 'unknown';
}
