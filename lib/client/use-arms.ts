'use client';

import { libraryArmListSchema, libraryArmSchema } from '@/lib/contracts/arms';
import { useAnswer } from './use-answer';

export function useArms() {
  return useAnswer('/api/arms', libraryArmListSchema);
}

export function useArm(armId: string) {
  return useAnswer(`/api/arms/${armId}`, libraryArmSchema);
}
