import { z } from 'zod';
import { route } from '@/lib/server/http';
import { readShared } from '@/lib/server/share/read-shared';
import { sealed, tokenParam } from '@/lib/server/share/sealed';

const params = z.object({ token: tokenParam });

export const GET = sealed(
  route({ role: 'public', params }, ({ params, request }) => readShared(params.token, request)),
);
