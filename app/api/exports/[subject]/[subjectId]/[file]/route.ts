import { exportParamsSchema } from '@/lib/contracts/exports';
import { download } from '@/lib/server/exports/download';
import { exportFile } from '@/lib/server/exports/export-file';
import { route } from '@/lib/server/http';

export const GET = route({ role: 'viewer', params: exportParamsSchema }, async ({ actor, params }) => {
  const { fileName, mediaType, text } = await exportFile(actor, params.subject, params.subjectId, params.file);
  return download(fileName, mediaType, text);
});
