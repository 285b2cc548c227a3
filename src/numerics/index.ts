export type { FailureDetail } from './failure.js';
export { FilterFailure } from './failure.js';
