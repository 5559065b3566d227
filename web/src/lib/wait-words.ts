/** When another try is allowed, in words a person waits by. */
export const waitWords = (retryAfterS: number | null): string => {
  if (retryAfterS === null) return 'Wait a few minutes, then try again.';
  if (retryAfterS < 90) return `Try again in ${Math.ceil(retryAfterS)} seconds.`;
  return `Try again in ${Math.ceil(retryAfterS / 60)} minutes.`;
};
