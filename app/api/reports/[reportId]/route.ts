import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { readReport, removeReport } from '@/lib/server/reports/read-report';

const params = z.object({ reportId: idSchema });

export const GET = route({ role: 'viewer', params }, ({ actor, params }) => readReport(actor, params.reportId));

export const DELETE = route({ role: 'viewer', params }, ({ actor, params }) => removeReport(actor, params.reportId));
