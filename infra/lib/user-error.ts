/** A problem the person at the terminal can solve: its message is shown without a stack. */
export class UserError extends Error {
  override name = 'UserError';
}
