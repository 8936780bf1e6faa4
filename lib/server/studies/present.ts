import type { Study as Answer } from '@/lib/contracts/studies';
import type { Study } from '@/models';

export function presentStudy(study: Study): Answer {
  return {
    id: study.id,
    key: study.key,
    state: study.state,
    progress: { done: study.slicesDone, total: study.sliceCount },
    failure: study.failure ?? null,
    answer: study.answer ?? null,
    askedAt: study.createdAt.toISOString(),
    finishedAt: study.finishedAt?.toISOString() ?? null,
  };
}
