/**
 * Reads a typed number: a comma or a point, spaces between thousands, any minus sign. Null for an empty or unreadable text.
 */
export function parseNumber(text: string): number | null {
  const plain = text
    .replace(/[\s\u00a0\u202f]/g, '')
    .replace(/[\u2212\u2013]/g, '-')
    .replace(',', '.');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)$/.test(plain)) return null;
  return Number(plain);
}
