import { reportListQuerySchema, reportRequestSchema } from '@/lib/contracts/reports';
import { answer, route } from '@/lib/server/http';
import { askReport } from '@/lib/server/reports/ask-report';
import { listReports } from '@/lib/server/reports/read-report';

export const GET = route({ role: 'viewer', query: reportListQuerySchema }, async ({ actor, query }) => ({
  reports: await listReports(actor, query.subject, query.subjectId),
}));

export const POST = route({ role: 'viewer', body: reportRequestSchema }, async ({ actor, body }) =>
  answer(await askReport(actor, body), { status: 202 }),
);
