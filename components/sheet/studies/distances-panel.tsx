'use client';

import { DeviceSection } from './device-section';
import { FiguresSection } from './figures-section';
import { GapSection } from './gap-section';
import { SpacesSection } from './spaces-section';
import { WalkwaySection } from './walkway-section';

/** Spaces of the robots and the distances that people are kept at. */
export function DistancesPanel() {
  return (
    <>
      <SpacesSection />
      <DeviceSection />
      <GapSection />
      <WalkwaySection />
      <FiguresSection />
    </>
  );
}
