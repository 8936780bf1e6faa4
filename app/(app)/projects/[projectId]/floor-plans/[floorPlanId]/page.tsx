import type { Metadata } from 'next';
import { CalibrationPage } from '@/components/calibration/calibration-page';

export const metadata: Metadata = { title: 'Floor plan to scale' };

export default async function Page({ params }: { params: Promise<{ projectId: string; floorPlanId: string }> }) {
  return <CalibrationPage {...await params} />;
}
