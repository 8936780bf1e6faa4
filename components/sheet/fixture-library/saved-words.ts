import type { LibraryFixture } from '@/lib/contracts/library-fixtures';

const counted = (count: number, one: string): string => (count === 1 ? `1 ${one}` : `${count} ${one}s`);

/** What a saved fixture brings along, in words. */
export function savedWords({ content }: LibraryFixture): string {
  const { taskPoints, taskPaths, taskPatterns } = content;
  const parts = [
    counted(taskPoints.length, 'task point'),
    ...(taskPaths.length > 0 ? [counted(taskPaths.length, 'task path')] : []),
    ...(taskPatterns.length > 0 ? [counted(taskPatterns.length, 'task pattern')] : []),
  ];
  return parts.join(', ');
}
