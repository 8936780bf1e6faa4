/**
 * Calls `end` when this process is told to stop. npm keeps a TERM to itself and ends, so where npm has started us its end
 * counts as one.
 */
export function onStop(end) {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void end());
  const parent = process.ppid;
  if (process.env.npm_lifecycle_event) setInterval(() => process.ppid !== parent && end(), 500).unref();
  // A terminal or pipe that goes away must not end us before what we started has been stopped.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {});
}
