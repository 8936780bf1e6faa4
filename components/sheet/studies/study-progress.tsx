'use client';

import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Progress } from '@/components/ui/progress';
import { isUnderWay, type FollowedStudy } from '@/lib/client/use-study';

/** How far a study has come, how it is stopped, and why there is none. Nothing once it is done. */
export function StudyProgress({ followed, label }: { readonly followed: FollowedStudy; readonly label: string }) {
  const { study, trouble, cancel, retry } = followed;
  if (trouble) return <Notice tone="trouble">{trouble}</Notice>;
  if (!study) return <p className="text-sm text-ink-soft">Looking for the study</p>;
  const again = (
    <Button size="small" onClick={() => void retry()}>
      Start again
    </Button>
  );
  if (study.state === 'failed') {
    return (
      <Notice tone="trouble" action={again}>
        {study.failure}
      </Notice>
    );
  }
  if (study.state === 'cancelled') return <Notice action={again}>Stopped before it was done.</Notice>;
  if (!isUnderWay(study)) return null;
  const { done, total } = study.progress;
  return (
    <Progress
      label={study.state === 'queued' ? `${label}: waiting for a worker` : label}
      share={done / total}
      action={
        <Button variant="quiet" size="small" onClick={() => void cancel()}>
          Stop
        </Button>
      }
    />
  );
}
