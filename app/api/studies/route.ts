import { studyQuestionSchema } from '@/lib/contracts/studies';
import { answer, route } from '@/lib/server/http';
import { askStudy, presentStudy } from '@/lib/server/studies';

/** Asks for a study: 200 with the stored one, 202 with one that is under way. */
export const POST = route({ role: 'planner', body: studyQuestionSchema }, async ({ actor, body }) => {
  const study = await askStudy(actor, body);
  return answer(presentStudy(study), { status: study.state === 'done' ? 200 : 202 });
});
