export { answer } from './answer';
export { route } from './route';
export type { RouteContext } from './route';
