import type { Metadata } from 'next';
import { ArmsPage } from '@/components/arms/arms-page';

export const metadata: Metadata = { title: 'Arms' };

export default function Page() {
  return <ArmsPage />;
}
