/** Nothing was held; `message` says why, in words for the person. */
export class HoldError extends Error {
  override readonly name = 'HoldError';
}
