/** The key of `Authorization: Bearer …`; null without such a header, empty where it bears none. */
export function readBearer(request: Request): string | null {
  const header = request.headers.get('authorization');
  if (header === null || !/^bearer(\s|$)/i.test(header)) return null;
  return header.slice('bearer'.length).trim();
}
