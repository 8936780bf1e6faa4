import { PRINT_PALETTE } from '@/lib/layout/palette';
import type { VerdictBand } from '@/lib/layout/verdict-words';

const { green, red, inkSoft, amber } = PRINT_PALETTE;

/** The colour of a verdict as a mark. */
export function bandColour(band: string | undefined): string {
  if (band === 'roomy' || band === 'fair') return green;
  if (band === 'tight') return '#b87700';
  return band === 'pinned' || band === 'out' ? red : inkSoft;
}

/** The same as letters, dark enough to read. */
export function bandTextColour(band: string | undefined): string {
  return band === 'tight' ? amber : bandColour(band);
}

export const BAND_NAMES: Record<VerdictBand, string> = {
  roomy: 'Roomy',
  fair: 'Fair',
  tight: 'Tight',
  pinned: 'Pinned',
  out: 'Out of reach',
};
