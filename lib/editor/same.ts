/** Deep equality of plain documents. Key order and absent against undefined make no difference: both change on the way to the server. */
export function same(left: unknown, right: unknown): boolean {
  if (Object.is(left, right)) return true;
  if (typeof left !== 'object' || typeof right !== 'object' || left === null || right === null) return left === right;
  if (Array.isArray(left) || Array.isArray(right)) {
    if (!Array.isArray(left) || !Array.isArray(right) || left.length !== right.length) return false;
    return left.every((entry, index) => same(entry, right[index]));
  }
  const one = left as Record<string, unknown>;
  const other = right as Record<string, unknown>;
  for (const key of new Set([...Object.keys(one), ...Object.keys(other)])) {
    if (!same(one[key], other[key])) return false;
  }
  return true;
}
