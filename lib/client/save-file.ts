import { problemFrom, unreachable } from './problem-error';

/** Fetches a file and hands it to the reader's disk under the server's name for it. Throws ProblemError. */
export async function saveFile(url: string): Promise<string> {
  let response: Response;
  try {
    response = await fetch(url, { credentials: 'same-origin' });
  } catch {
    throw unreachable();
  }
  if (!response.ok) throw problemFrom(response.status, await response.json().catch(() => null));
  const blob = await response.blob();
  const name = /filename="([^"]+)"/.exec(response.headers.get('content-disposition') ?? '')?.[1] ?? 'download';
  const address = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  link.click();
  // The browser reads the blob after the click; a minute later it has.
  setTimeout(() => URL.revokeObjectURL(address), 60_000);
  return name;
}
