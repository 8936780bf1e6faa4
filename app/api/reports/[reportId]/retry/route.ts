import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { retryReport } from '@/lib/server/reports/ask-report';

const params = z.object({ reportId: idSchema });

export const POST = route({ role: 'viewer', params }, ({ actor, params }) => retryReport(actor, params.reportId));
