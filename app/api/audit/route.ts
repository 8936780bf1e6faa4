import { auditQuerySchema } from '@/lib/contracts/audit';
import { readAudit } from '@/lib/server/audit-log/read-audit';
import { route } from '@/lib/server/http';

export const GET = route({ role: 'admin', query: auditQuerySchema }, ({ actor, query }) => readAudit(actor, query));
