import { type Dose, formatDose } from '../training/dose';
import { figure, secondsText } from '../training/figures';
import type { DoseRule } from './doseRule';

/** The largest amount that a dose holds. */
const most = 10_000;

/**
 * The dose of what is done instead. The load is dropped: it names the weight of the kit that is missing, and 60 kg on a bar says
 * nothing about a single dumbbell; a rule of type `fixed` brings its own. A tempo stays as long as repetitions are counted.
 * Amounts are whole, halves rounded down (a substitution is no test of strength), at least 1 and never over the rule's cap.
 * @param dose of the movement that is replaced
 */
export function convertDose(dose: Dose, rule: DoseRule): Dose {
  switch (rule.type) {
    case 'same':
      return { ...dose, load: null };
    case 'samePerSide':
      return { ...dose, load: null, perSide: true };
    case 'times':
      return { ...scaled(dose, rule.factor, rule.cap), load: null };
    case 'secondsForReps': {
      // what is in seconds already stays; calories and metres count like repetitions, one each
      const factor = dose.unit === 'seconds' ? 1 : rule.secondsPerRep;
      return { ...scaled(dose, factor, rule.cap), unit: 'seconds', load: null, tempo: null };
    }
    case 'fixed':
      return rule.dose;
  }
}

function scaled(dose: Dose, factor: number, cap: number | null): Dose {
  const limit = Math.min(cap ?? most, most);
  const scale = (value: number) => Math.min(Math.max(1, Math.ceil(value * factor - 0.5 - rounding)), limit);
  const amount = scale(dose.amount);
  const amountTo = dose.amountTo === null ? null : scale(dose.amountTo);
  return { ...dose, amount, amountTo: amountTo !== null && amountTo > amount ? amountTo : null };
}

/** 7 × 1.1 is 7.700000000000001: the tail of a product must not tip a half. */
const rounding = 1e-9;

/** A dose rule in a coach's words: "half again as many, at most 30". */
export function explainRule(rule: DoseRule): string {
  switch (rule.type) {
    case 'same':
      return 'same count';
    case 'samePerSide':
      return 'same count on each side';
    case 'times':
      return `${timesWords(rule.factor)}${rule.cap === null ? '' : `, at most ${figure(rule.cap)}`}`;
    case 'secondsForReps':
      return `${secondsText(rule.secondsPerRep)} for each rep${rule.cap === null ? '' : `, at most ${secondsText(rule.cap)}`}`;
    case 'fixed':
      return `always ${formatDose(rule.dose)}`;
  }
}

const namedFactors: Readonly<Record<string, string>> = {
  0.5: 'half as many',
  1: 'same count',
  1.5: 'half again as many',
  2: 'twice as many',
  3: 'three times as many',
};

const timesWords = (factor: number) => namedFactors[String(factor)] ?? `${figure(factor)} times as many`;
