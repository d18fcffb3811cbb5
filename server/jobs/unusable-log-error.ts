/** A log that cannot become nights, though it may be one: the message is for people. */
export class UnusableLogError extends Error {}
