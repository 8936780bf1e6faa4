import { randomInt } from 'node:crypto';
import { mkdir, readFile, rename, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { z } from 'zod';
import { roleSchema } from '@/lib/contracts/common';

const demoAccountSchema = z.object({
  role: roleSchema,
  name: z.string(),
  email: z.string(),
  password: z.string(),
  organisation: z.string(),
});
export type DemoAccount = z.infer<typeof demoAccountSchema>;

/** An empty list where the file is missing or is none of ours. */
export async function readDemoAccounts(file: string): Promise<DemoAccount[]> {
  try {
    return z.array(demoAccountSchema).parse(JSON.parse(await readFile(file, 'utf8')));
  } catch {
    return [];
  }
}

/** Readable by its owner alone, and never half written. */
export async function writeDemoAccounts(file: string, accounts: DemoAccount[]): Promise<void> {
  await mkdir(path.dirname(file), { recursive: true });
  const draft = `${file}.${process.pid}`;
  await writeFile(draft, `${JSON.stringify(accounts, null, 2)}\n`, { mode: 0o600 });
  await rename(draft, file);
}

/** Letters and digits that are not taken for one another when read aloud. */
const ALPHABET = 'abcdefghjkmnpqrstuvwxyz23456789';

/** Three groups of five: about 74 bits. */
export function makePassword(): string {
  const group = () => Array.from({ length: 5 }, () => ALPHABET[randomInt(ALPHABET.length)]).join('');
  return [group(), group(), group()].join('-');
}
