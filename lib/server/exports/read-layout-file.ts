import {
  LAYOUT_FILE_FORMAT,
  LAYOUT_FILE_VERSION,
  layoutFileSchema,
  type LayoutFile,
} from '@/lib/contracts/layout-file';
import { AppError, invalidFields, type FieldError } from '../errors';
import { jsonFaultAt, placeInText } from './json-fault';
import { layoutFileHash } from './layout-file';

const refusal = (code: string, path: string, detail: string): AppError =>
  new AppError({ status: 422, code, detail, errors: [{ path, message: detail }] });

const foreign = (what: string): AppError =>
  refusal('file_foreign', '', `${what} Choose a JSON file that was exported from Elbowroom. Nothing was changed.`);

/**
 * Reads a layout file, or says what is wrong with it and where. Nothing of a file is passed over: a member that this version does not
 * know is refused like one that is wrong.
 * @throws 422 `file_foreign`, `file_damaged`, `file_newer`, `file_changed`, or `invalid` with one entry a fault.
 */
export function readLayoutFile(bytes: Uint8Array): LayoutFile {
  const raw = parsed(decoded(bytes));
  demandOurs(raw);
  if (typeof raw.sha256 === 'string' && raw.sha256 !== layoutFileHash(raw)) {
    throw refusal(
      'file_changed',
      'sha256',
      'This file was changed after it was exported: its checksum does not fit. Export it again. If the change was meant, take the ' +
        'member "sha256" out of the file and import it again. Nothing was changed.',
    );
  }
  const result = layoutFileSchema.safeParse(raw);
  if (!result.success) {
    throw invalidFields(
      result.error.issues.slice(0, 50).map(({ path, message }) => ({ path: path.map(String).join('.'), message })),
    );
  }
  const faults = [...unknownMembers(raw, result.data, ''), ...loosePointers(result.data)];
  if (faults.length > 0) throw invalidFields(faults.slice(0, 50));
  return result.data;
}

function decoded(bytes: Uint8Array): string {
  if (bytes.byteLength === 0) throw foreign('This file is empty.');
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw foreign('This file is not text.');
  }
}

function parsed(text: string): unknown {
  if (!/^\s*[{[]/.test(text)) throw foreign('This file is not a layout file.');
  try {
    return JSON.parse(text) as unknown;
  } catch {
    const where = placeInText(text, jsonFaultAt(text));
    throw refusal(
      'file_damaged',
      where,
      `This file is damaged: it stops being JSON at ${where}. Export it again, or fetch it anew. Nothing was changed.`,
    );
  }
}

function demandOurs(raw: unknown): asserts raw is Record<string, unknown> {
  if (typeof raw !== 'object' || raw === null || Array.isArray(raw)) throw foreign('This file is not a layout file.');
  const { format, version } = raw as Record<string, unknown>;
  if (format !== LAYOUT_FILE_FORMAT) {
    throw foreign(`This JSON file is not a layout: its member "format" is not "${LAYOUT_FILE_FORMAT}".`);
  }
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1) {
    throw refusal('file_damaged', 'version', 'This file is damaged: its member "version" is no version number.');
  }
  if (version > LAYOUT_FILE_VERSION) {
    throw refusal(
      'file_newer',
      'version',
      `This file has version ${version}; this Elbowroom reads up to version ${LAYOUT_FILE_VERSION}. Update Elbowroom, or export ` +
        'the layout from an older one. Nothing was changed.',
    );
  }
}

/** What reading has dropped: the schema passes over members that it does not know, a hand-over must not. */
function unknownMembers(raw: unknown, read: unknown, path: string): FieldError[] {
  if (Array.isArray(raw) && Array.isArray(read)) {
    return raw.flatMap((entry, index) => unknownMembers(entry, read[index], joined(path, String(index))));
  }
  if (typeof raw !== 'object' || raw === null || typeof read !== 'object' || read === null) return [];
  return Object.entries(raw).flatMap(([key, value]) => {
    const here = joined(path, key);
    if (key in read) return unknownMembers(value, (read as Record<string, unknown>)[key], here);
    return [{ path: here, message: 'This version of Elbowroom does not know this member. Take it out, or update.' }];
  });
}

const joined = (path: string, key: string): string => (path ? `${path}.${key}` : key);

/** Ids that are there twice, and robots whose arm is not in the file. */
function loosePointers({ items, arms }: LayoutFile): FieldError[] {
  const known = new Set(arms.map(({ id }) => id));
  const seen = new Set<string>();
  return items.flatMap((item, index) => {
    const faults: FieldError[] = [];
    if (seen.has(item.id))
      faults.push({ path: `items.${index}.id`, message: 'An item before this one has the same id.' });
    seen.add(item.id);
    if (item.kind === 'robot' && !known.has(item.armId)) {
      faults.push({ path: `items.${index}.armId`, message: 'No arm of this file has this id.' });
    }
    return faults;
  });
}
