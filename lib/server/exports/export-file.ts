import type { ExportFile, ExportSubject } from '@/lib/contracts/exports';
import { dxfOf } from '@/lib/layout/export/dxf';
import { drawnSheet } from '@/lib/layout/export/drawn-sheet';
import { mapCsv, verdictsCsv } from '@/lib/layout/export/tables';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import type { Actor } from '../policy';
import { layoutFileOf, layoutFileText } from './layout-file';
import { placedMapsOf } from './placed-maps';
import { fileStem, handedSheet, type HandedSheet } from './subject';

interface Export {
  readonly fileName: string;
  readonly mediaType: string;
  readonly text: string;
}

const MEDIA_TYPES: Record<ExportFile, string> = {
  'layout.json': 'application/json; charset=utf-8',
  'layout.dxf': 'image/vnd.dxf',
  'verdicts.csv': 'text/csv; charset=utf-8; header=present',
  'map.csv': 'text/csv; charset=utf-8; header=present',
};

/** One file of a sheet, as it is now. Throws 404, 403, and 409 `map_not_ready` for the values of maps that are not finished. */
export async function exportFile(
  actor: Actor,
  subject: ExportSubject,
  subjectId: string,
  file: ExportFile,
): Promise<Export> {
  const sheet = await handedSheet(actor, subject, subjectId);
  const text = await textOf(actor, sheet, file);
  await inTransaction((transaction) =>
    recordAudit(actor, { action: 'sheet.exported', subjectId, details: { file, of: subject } }, transaction),
  );
  const [stem, ending] = file.split('.');
  const suffix = stem === 'layout' ? '' : `-${stem}`;
  return { fileName: `${fileStem(sheet)}${suffix}.${ending}`, mediaType: MEDIA_TYPES[file], text };
}

async function textOf(actor: Actor, { snapshot }: HandedSheet, file: ExportFile): Promise<string> {
  const { items, arms, mapSettings } = snapshot;
  switch (file) {
    case 'layout.json':
      return layoutFileText(await layoutFileOf(snapshot));
    case 'layout.dxf':
      return dxfOf(drawnSheet(items, arms, mapSettings.wrist).shapes);
    case 'verdicts.csv':
      return verdictsCsv(items, drawnSheet(items, arms, mapSettings.wrist).verdicts);
    case 'map.csv': {
      const maps = await placedMapsOf(snapshot, actor.organisationId);
      if (maps.length === 0) {
        throw conflict(
          'map_not_ready',
          'This sheet has no finished map yet. Open it, wait for its maps, then export their values.',
        );
      }
      return mapCsv(items, maps, mapSettings.toolHeightMm);
    }
  }
}
