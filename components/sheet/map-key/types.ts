/** What stands between the sheet and its map. Several robots are told as one: the sum of their work, or the first failure. */
export type MapWork =
  | { readonly kind: 'none' }
  | { readonly kind: 'noRobots' }
  | { readonly kind: 'notAsked' }
  | { readonly kind: 'queued' }
  | { readonly kind: 'running'; readonly done: number; readonly total: number }
  | { readonly kind: 'cancelled' }
  | { readonly kind: 'failed'; readonly reason: string };
