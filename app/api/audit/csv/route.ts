import { auditFilterSchema } from '@/lib/contracts/audit';
import { auditCsv } from '@/lib/server/audit-log/read-audit';
import { download } from '@/lib/server/exports/download';
import { route } from '@/lib/server/http';

export const GET = route({ role: 'admin', query: auditFilterSchema }, async ({ actor, query }) =>
  download('audit.csv', 'text/csv; charset=utf-8; header=present', await auditCsv(actor, query)),
);
