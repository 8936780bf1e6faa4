import type { LibraryArm } from '@/lib/contracts/arms';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { fakeId } from './fakes';

/** A version of the medium six-axis arm of the built-in library. */
export function fakeArm(number: number, part: Partial<LibraryArm> = {}): LibraryArm {
  const { name, description, payloadKg, arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!;
  return {
    id: fakeId(number),
    familyId: fakeId(800),
    version: 1,
    name,
    description,
    payloadKg,
    reachMm: 1411,
    definition: structuredClone(arm) as LibraryArm['definition'],
    createdAt: new Date(Date.UTC(2026, 2, number % 28)).toISOString(),
    latest: true,
    layoutCount: 0,
    archivedAt: null,
    ...part,
  };
}
