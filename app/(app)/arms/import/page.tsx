import type { Metadata } from 'next';
import { ForIntegrators } from '@/components/arms/for-integrators';
import { ImportArmPage } from '@/components/arms/import-arm-page';

export const metadata: Metadata = { title: 'Import an arm' };

export default function Page() {
  return (
    <ForIntegrators>
      <ImportArmPage />
    </ForIntegrators>
  );
}
