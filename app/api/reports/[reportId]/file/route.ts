import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { reportFile } from '@/lib/server/reports/read-report';

const params = z.object({ reportId: idSchema });

export const GET = route({ role: 'viewer', params }, ({ actor, params }) => reportFile(actor, params.reportId));
