import type { ArmContent } from '@/lib/contracts/arms';
import { writeArmTable } from '@/lib/layout/arm-import/table';

/** Hands the table of an arm to the browser as a file. */
export function downloadTable(arm: ArmContent): void {
  const url = URL.createObjectURL(new Blob([writeArmTable(arm)], { type: 'text/csv;charset=utf-8' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = `${arm.name.replace(/[^\p{L}\p{N}.-]+/gu, ' ').trim() || 'arm'}.csv`;
  link.click();
  setTimeout(() => URL.revokeObjectURL(url));
}
