export { askStudy } from './ask-study';
export { cancelStudy } from './cancel-study';
export { findStudy } from './data';
export { presentStudy } from './present';
export { retryStudy } from './retry-study';
