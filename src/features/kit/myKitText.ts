import type { OwnedKit } from '../../../shared/domain/kit/kit';

/** Loads as they are shown and typed: “12 16 16”. */
export const loadsText = (loadsKg: readonly number[]): string => loadsKg.join(' ');

/**
 * Loads as people type them: “12 16 16”, “12,5; 16 kg”. A comma between digits without a space is a decimal comma.
 * @returns kilograms, or a sentence that says what does not fit
 */
export function readLoads(text: string): number[] | { fault: string } {
  const parts = text
    .replace(/kg/gi, ' ')
    .replace(/(\d),(\d)/g, '$1.$2')
    .split(/[^\d.]+/)
    .filter(Boolean);
  const loads = parts.map(Number);
  if (loads.some((kg) => !Number.isFinite(kg) || kg <= 0 || kg > 500))
    return { fault: 'Write each load in kg, like 12 16 16.' };
  if (loads.length > 50) return { fault: 'At most 50 loads.' };
  return loads;
}

/** So many as there are loads, or as many as were counted before. */
export function withLoads(owned: OwnedKit, loadsKg: number[]): OwnedKit {
  return { ...owned, loadsKg, count: Math.max(owned.count, loadsKg.length) };
}
