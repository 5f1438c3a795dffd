/** A mistake of the caller: its message is all that is shown, and the command ends with code 2. */
export class UsageError extends Error {}
