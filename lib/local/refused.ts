/** A fault that the person at the terminal can act on: shown as its one line, without a stack. */
export class Refused extends Error {}
