import { refusal } from '../numerics/index.js';

/** @throws FilterFailure E_TYPE unless a family's request is an object */
export function checkRequest(request: unknown): void {
  if (typeof request === 'object' && request !== null) return;
  throw refusal(
    'E_TYPE',
    'request',
    request,
    'an object with the order of the filter',
    'pass { order: 6, returnLossDb: 22 } or the like',
  );
}
