import type { DoseRule } from '../../../shared/domain/kit/doseRule';
import { formatDose, parseDose } from '../../../shared/domain/training/dose';
import { readFigure } from './movementValues';

/** A dose rule as its fields hold it, the figures as typed. */
export type RuleDraft = {
  type: DoseRule['type'];
  factor: string;
  secondsPerRep: string;
  /** at most so many; empty for no limit */
  cap: string;
  dose: string;
};

export const ruleTypes = [
  { value: 'same', label: 'The same count' },
  { value: 'samePerSide', label: 'The same count on each side' },
  { value: 'times', label: 'So many times the count' },
  { value: 'secondsForReps', label: 'Seconds instead of reps' },
  { value: 'fixed', label: 'Always one dose' },
] as const satisfies readonly { value: DoseRule['type']; label: string }[];

export const emptyRule: RuleDraft = { type: 'same', factor: '1.5', secondsPerRep: '3', cap: '', dose: '' };

export function draftOf(rule: DoseRule): RuleDraft {
  const cap = 'cap' in rule && rule.cap !== null ? String(rule.cap) : '';
  return {
    ...emptyRule,
    type: rule.type,
    cap,
    ...(rule.type === 'times' ? { factor: String(rule.factor) } : {}),
    ...(rule.type === 'secondsForReps' ? { secondsPerRep: String(rule.secondsPerRep) } : {}),
    ...(rule.type === 'fixed' ? { dose: formatDose(rule.dose) } : {}),
  };
}

export type RuleFault = { field: keyof RuleDraft; fault: string };

/** @returns the rule, or which field does not fit and why */
export function readRule(draft: RuleDraft): DoseRule | RuleFault {
  switch (draft.type) {
    case 'same':
    case 'samePerSide':
      return { type: draft.type };
    case 'times': {
      const factor = readFigure(draft.factor);
      if (!(factor > 0 && factor <= 20)) return { field: 'factor', fault: 'A figure over 0 and up to 20, like 1.5.' };
      const cap = readCap(draft.cap, 10_000);
      return typeof cap === 'object' && cap ? cap : { type: 'times', factor, cap };
    }
    case 'secondsForReps': {
      const secondsPerRep = readFigure(draft.secondsPerRep);
      if (!(secondsPerRep > 0 && secondsPerRep <= 60))
        return { field: 'secondsPerRep', fault: 'Seconds over 0 and up to 60, like 3.' };
      const cap = readCap(draft.cap, 3600);
      return typeof cap === 'object' && cap ? cap : { type: 'secondsForReps', secondsPerRep, cap };
    }
    case 'fixed': {
      const dose = parseDose(draft.dose);
      return 'fault' in dose ? { field: 'dose', fault: dose.fault } : { type: 'fixed', dose };
    }
  }
}

function readCap(text: string, most: number): number | null | RuleFault {
  if (text.trim() === '') return null;
  const cap = readFigure(text);
  return cap > 0 && cap <= most ? cap : { field: 'cap', fault: `A figure over 0 and up to ${most}, or nothing.` };
}
