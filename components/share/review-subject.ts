import type { SheetDocument } from '@/lib/client/sheet-document';
import type { Review } from '@/lib/client/use-review';
import type { Person } from '@/lib/contracts/remarks';
import type { SignOffs } from '@/lib/client/use-sign-offs';
import type { StoredMap } from '@/lib/client/use-stored-maps';

/** What a review page shows, whether it was opened by a link or by somebody signed in. */
export interface ReviewSubject {
  readonly document: SheetDocument;
  readonly note: string;
  readonly maps: ReadonlyMap<string, StoredMap> | null;
  readonly mapsError: Error | undefined;
  /** Must keep its identity between renders. */
  readonly pictureUrl: (widthPx: number) => string;
  readonly review: Review;
  readonly signOffs: SignOffs;
  /** Of the frozen content, and the revision's number: what a sign-off is bound to. */
  readonly sha256: string;
  readonly number: number;
  readonly maySign: boolean;
  readonly mayRemark: boolean;
  /** Members who can be named; none for guests, who do not know them. */
  readonly people: readonly Person[];
  /** Guests give name and e-mail address with what they write. */
  readonly asGuest: boolean;
}
