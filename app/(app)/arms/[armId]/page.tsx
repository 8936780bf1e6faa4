import type { Metadata } from 'next';
import { ArmPage } from '@/components/arms/arm-page';

export const metadata: Metadata = { title: 'Arm' };

export default async function Page({ params }: { params: Promise<{ armId: string }> }) {
  return <ArmPage {...await params} />;
}
