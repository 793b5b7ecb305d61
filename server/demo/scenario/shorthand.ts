import type { Dose } from '../../../shared/domain/training/dose';
import type { DemoKitNeed, DemoKitOption, DemoLine, DemoLineSubstitution, DemoOwnedKit } from './shapes';

/** Short ways to write plans and kit, so that the scenario reads like a coach's notebook. */

const dose = (amount: number, unit: Dose['unit'], more: Partial<Dose> = {}): Dose => ({
  amount,
  amountTo: null,
  unit,
  perSide: false,
  load: null,
  tempo: null,
  ...more,
});

export const reps = (amount: number, more?: Partial<Dose>) => dose(amount, 'reps', more);
export const perSide = (amount: number, more?: Partial<Dose>) => dose(amount, 'reps', { perSide: true, ...more });
export const seconds = (amount: number, more?: Partial<Dose>) => dose(amount, 'seconds', more);
export const secondsPerSide = (amount: number) => dose(amount, 'seconds', { perSide: true });
export const metres = (amount: number, more?: Partial<Dose>) => dose(amount, 'metres', more);
export const kilos = (kg: number): Dose['load'] => ({ kg, typed: `${kg} kg` });

export const line = (
  movement: string,
  dose: Dose,
  more: { note?: string; substitutions?: readonly DemoLineSubstitution[] } = {},
): DemoLine => ({ movement, dose, note: more.note ?? '', substitutions: more.substitutions ?? [] });

/** Instead of a line's movement, for want of a piece of kit. */
export const without = (missingKit: string, movement: string, dose: Dose, reason: string): DemoLineSubstitution => ({
  movement,
  missing: 'kit',
  missingKit,
  dose,
  reason,
});

/** Instead of a line's movement, while it is still too hard. */
export const easier = (movement: string, dose: Dose, reason: string): DemoLineSubstitution => ({
  movement,
  missing: 'ability',
  missingKit: null,
  dose,
  reason,
});

export const option = (kit: string, count = 1, minLoadKg: number | null = null): DemoKitOption => ({
  kit,
  count,
  minLoadKg,
});
/** Needs one of these. */
export const oneOf = (...anyOf: readonly DemoKitOption[]): DemoKitNeed => ({ anyOf });
export const needs = (kit: string, count = 1, minLoadKg: number | null = null): DemoKitNeed =>
  oneOf(option(kit, count, minLoadKg));

export const owns = (kit: string, ...loadsKg: readonly number[]): DemoOwnedKit => ({
  kit,
  count: Math.max(loadsKg.length, 1),
  loadsKg,
});
