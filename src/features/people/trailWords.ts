/** An entry of the trail in words: `movement.renamed` is “movement renamed”. */
export const trailWords = (action: string): string =>
  action.replaceAll('.', ' ').replace(/([a-z])([A-Z])/g, (_, a: string, b: string) => `${a} ${b.toLowerCase()}`);

const isId = (value: unknown) => typeof value === 'string' && /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(value);

/** The plain values of an entry's details: “from: Ring row, to: Body row”. Ids say nothing to anybody. */
export const trailDetails = (details: Record<string, unknown>): string =>
  Object.entries(details)
    .filter(
      ([, value]) =>
        (typeof value === 'string' && !isId(value)) || typeof value === 'number' || typeof value === 'boolean',
    )
    .map(([name, value]) => `${trailWords(name)}: ${value}`)
    .join(', ');

/** Where at the desk each subject has its page. */
export const trailPlaces: Partial<Record<string, string>> = {
  session: 'sessions',
  recording: 'footage',
  movement: 'movements',
};
