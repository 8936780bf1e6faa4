import type { Metadata } from 'next';
import { TokensPage } from '@/components/api-tokens/tokens-page';

export const metadata: Metadata = { title: 'API tokens' };

export default function Page() {
  return <TokensPage />;
}
