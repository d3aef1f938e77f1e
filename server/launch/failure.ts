/** A failure that the person who starts the server can mend: shown as its words alone, without a stack. */
export class LaunchFailure extends Error {}
