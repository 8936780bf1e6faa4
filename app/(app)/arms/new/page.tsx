import type { Metadata } from 'next';
import { NewArmPage } from '@/components/arms/new-arm-page';

export const metadata: Metadata = { title: 'New arm' };

export default function Page() {
  return <NewArmPage />;
}
