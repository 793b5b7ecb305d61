/** An entry of the trail in words: `movement.renamed` is “movement renamed”. */
export const trailWords = (action: string): string =>
  action.replaceAll('.', ' ').replace(/([a-z])([A-Z])/g, (_, a: string, b: string) => `${a} ${b.toLowerCase()}`);

/** The plain values of an entry's details: “from: Ring row, to: Body row”. */
export const trailDetails = (details: Record<string, unknown>): string =>
  Object.entries(details)
    .filter(([, value]) => typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean')
    .map(([name, value]) => `${trailWords(name)}: ${value}`)
    .join(', ');
