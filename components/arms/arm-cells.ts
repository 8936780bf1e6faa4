import { formatFigure } from '@/components/ui/format-figure';
import type { TitleBlockCell } from '@/components/ui/title-block';

const NO_BREAK_SPACE = '\u00a0';

interface ArmInTitle {
  name: string;
  reachMm: number | null;
  payloadKg: number | null;
  version: number | null;
}

/** The cells of the title block; dashes for what is not known yet. */
export function armCells(arm: ArmInTitle | undefined): TitleBlockCell[] {
  const measure = (value: number | null | undefined, unit: string): string =>
    value === null || value === undefined || !Number.isFinite(value)
      ? '–'
      : `${formatFigure(value, { decimals: Number.isInteger(value) || unit === 'mm' ? 0 : 1 })}${NO_BREAK_SPACE}${unit}`;
  return [
    { label: 'Arm', value: arm ? arm.name || 'New arm' : '…', heading: true },
    { label: 'Reach', value: measure(arm?.reachMm, 'mm'), kind: 'figure' },
    { label: 'Payload', value: measure(arm?.payloadKg, 'kg'), kind: 'figure' },
    { label: 'Version', value: arm?.version ?? '–', kind: 'figure', wideOnly: true },
  ];
}
