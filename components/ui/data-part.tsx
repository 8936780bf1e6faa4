import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';

interface DataPartProps<Data> {
  /** What a hook gave: the answer, or why there is none. */
  answer: { data?: Data; error?: Error; mutate: () => unknown };
  /** Read aloud while it loads. */
  loading: string;
  children: (data: Data) => ReactNode;
}

/** Shows an answer, the line while it is awaited, or the refusal with a way to try again. */
export function DataPart<Data>({ answer, loading, children }: DataPartProps<Data>) {
  if (answer.data !== undefined) return children(answer.data);
  if (!answer.error) return <LoadingLine label={loading} />;
  return (
    <div className="p-3.5">
      <Notice
        tone="trouble"
        action={
          <Button size="small" onClick={() => void answer.mutate()}>
            Try again
          </Button>
        }
      >
        {answer.error.message}
      </Notice>
    </div>
  );
}
