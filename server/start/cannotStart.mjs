// @ts-check

/** An end that a person can mend: its message is all that is shown. */
export class CannotStart extends Error {}

/**
 * Ends a command: one clear message for what a person can mend, everything for what is ours.
 * @param {unknown} error
 * @returns {never}
 */
export function giveUp(error) {
  console.error(error instanceof CannotStart ? error.message : error);
  process.exit(1);
}
