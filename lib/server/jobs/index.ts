import type { JobDefinition } from './definition';
import { mailJob } from './mail';
import { mapTileJob } from './map-tile';
import { reportJob } from './report';
import { studySliceJob } from './study-slice';

export { deadLetterOf, type JobDefinition } from './definition';
export { mailJob, type MailJob } from './mail';
export { mapTileJob, type MapTileJob } from './map-tile';
export { reportJob, type ReportJob } from './report';
export { studySliceJob, type StudySliceJob } from './study-slice';

/** Every kind of job: the migrate step makes a queue for each, the worker takes from each. */
export const JOBS: readonly JobDefinition[] = [mapTileJob, studySliceJob, reportJob, mailJob];
