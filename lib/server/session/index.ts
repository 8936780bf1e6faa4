export { authOptions } from './auth-options';
export { readActor } from './read-actor';
