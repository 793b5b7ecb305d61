import { type Pattern, patterns } from '../../../shared/domain/words';

/** A pattern as a chip or a choice shows it: “Hold/stretch”. */
export const patternName = (pattern: Pattern): string => pattern.slice(0, 1).toUpperCase() + pattern.slice(1);

export const patternOptions = patterns.map((value) => ({ value, label: patternName(value) }));
