/** A reason not to start that the person who starts it can do something about. */
export class StartError extends Error {}
