/** The last error of a job as pg-boss has kept it, as a sentence for people. */
export function lastErrorOf(output: object | null): string {
  const message = messageIn(output) ?? messageIn(output && 'value' in output ? output.value : null);
  if (message === null) return 'it left no message.';
  if (/timeout|execution exceeded|shut down while active/.test(message))
    return 'its worker was stopped, or took too long.';
  return /[.!?]$/.test(message) ? message : `${message}.`;
}

function messageIn(value: unknown): string | null {
  if (value === null || typeof value !== 'object' || !('message' in value)) return null;
  return typeof value.message === 'string' && value.message !== '' ? value.message : null;
}
