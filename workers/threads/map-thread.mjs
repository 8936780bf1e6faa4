import { register } from 'tsx/esm/api';

// A thread does not take over the process's TypeScript loader, so it loads its own before anything else.
register();
const { computeTile, summarise } = await import('../../lib/server/maps/compute.ts');
const { answerStudy, computeSlice } = await import('../../lib/server/studies/compute.ts');

export { answerStudy, computeSlice, computeTile, summarise };
