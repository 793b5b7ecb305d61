export class CannotStart extends Error {}
export function giveUp(error: unknown): never;
