import type { TagTone } from '@/components/ui/tag';
import type { LayoutState } from '@/lib/contracts/layouts';

/** How the state of a variant or a revision is said, and the tone it is drawn in. */
export const STATE_WORDS: Record<LayoutState, { name: string; tone: TagTone }> = {
  draft: { name: 'Draft', tone: 'neutral' },
  issued: { name: 'In review', tone: 'fair' },
  accepted: { name: 'Accepted', tone: 'roomy' },
  changes_requested: { name: 'Changes asked for', tone: 'tight' },
  superseded: { name: 'Superseded', tone: 'neutral' },
};
