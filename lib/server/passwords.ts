import { hash, verify } from '@node-rs/argon2';

/** argon2id (the library's default) with 19 MiB, 2 passes, 1 lane: OWASP Password Storage Cheat Sheet, from memory. */
const PARAMETERS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** PHC string with its own salt. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, PARAMETERS);
}

let decoy: Promise<string> | null = null;

/** With null, for an unknown person, as much work is done as for a known one: the time must not tell them apart. */
export async function verifyPassword(passwordHash: string | null, password: string): Promise<boolean> {
  decoy ??= hashPassword('nobody has this password');
  const matches = await verify(passwordHash ?? (await decoy), password);
  return passwordHash !== null && matches;
}
