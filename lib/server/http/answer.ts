/**
 * A JSON answer with a status or headers of its own; a route that needs neither returns its data as it is.
 * `undefined` answers without a body: 204 unless another status is given.
 */
export function answer(data: unknown, options: { status?: number; headers?: Record<string, string> } = {}): Response {
  if (data === undefined) return new Response(null, { status: options.status ?? 204, headers: options.headers });
  return Response.json(data, { status: options.status ?? 200, headers: options.headers });
}
