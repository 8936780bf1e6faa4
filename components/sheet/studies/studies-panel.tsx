'use client';

import { ClearanceSection } from './clearance-section';
import { ErrorGainSection } from './error-gain-section';
import { StandingSection } from './standing-section';
import { ToleranceSection } from './tolerance-section';

/** Questions about the arrangement that take longer than a drag. */
export function StudiesPanel() {
  return (
    <>
      <StandingSection />
      <ToleranceSection />
      <ErrorGainSection />
      <ClearanceSection />
    </>
  );
}
