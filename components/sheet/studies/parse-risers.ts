/** Riser heights as typed, mm, or why they cannot be read. */
export function parseRisers(text: string, drawnMm: number): number[] | string {
  const parts = text.split(/[,;\s]+/).filter((part) => part !== '');
  if (parts.length === 0) return [drawnMm];
  const heights = parts.map(Number);
  const wrong = parts.find(
    (_, index) => !Number.isFinite(heights[index]) || heights[index] < 0 || heights[index] > 20_000,
  );
  if (wrong !== undefined) return `“${wrong}” is no riser height. Write millimetres from 0 on, such as 0, 200, 400.`;
  if (heights.length > 20) return 'At most 20 riser heights.';
  return [...new Set(heights)];
}
