/** One arc minute, the error that is stated for every turning joint. */
export const ARC_MINUTE_RAD = Math.PI / 180 / 60;

/**
 * The farthest that the tool point can be off (m), to first order, where joint i is off by at most `errors[i]` (rad or m): the
 * farthest corner of the set { Σ J_i e_i : |e_i| ≤ errors[i] }. Chains have few joints, so the corners are simply tried.
 *
 * @param jacobian rows x, y, z first.
 */
export function worstErrorM(jacobian: readonly (readonly number[])[], errors: readonly number[]): number {
  const columns = errors
    .map((error, joint) => [0, 1, 2].map((row) => jacobian[row][joint] * error))
    .filter((column) => column.some((value) => value !== 0));
  if (columns.length === 0) return 0;
  let worst = 0;
  // The set is symmetric, so the first sign can stay.
  for (let signs = 0; signs < 1 << (columns.length - 1); signs += 1) {
    const sum = [0, 0, 0];
    columns.forEach((column, index) => {
      const sign = (signs >> index) & 1 ? -1 : 1;
      for (let row = 0; row < 3; row += 1) sum[row] += sign * column[row];
    });
    worst = Math.max(worst, Math.hypot(...sum));
  }
  return worst;
}
