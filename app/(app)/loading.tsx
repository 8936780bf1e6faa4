import { LoadingLine } from '@/components/ui/loading-line';

export default function Loading() {
  return <LoadingLine label="Loading the page" />;
}
