import { layoutFileJsonSchema } from '@/lib/contracts/layout-file';
import { answer, route } from '@/lib/server/http';

/** Public: whoever writes or reads layout files needs no account for it. */
export const GET = route({ role: 'public' }, async () =>
  answer(layoutFileJsonSchema(), { headers: { 'content-type': 'application/schema+json' } }),
);
