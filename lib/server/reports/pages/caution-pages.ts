import { CAUTIONS } from '@/lib/layout/cautions';
import type { Flow } from './flow';

/** What the product itself must say beside its figures. */
export function cautionPages(flow: Flow): void {
  flow.heading('Cautions');
  for (const caution of CAUTIONS) flow.caution(caution);
}
