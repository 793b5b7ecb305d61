import { z } from 'zod';
import type { Substitution } from '../../../shared/contracts/movements';
import type { DoseRule } from '../../../shared/domain/kit/doseRule';
import { shortText } from '../../../shared/domain/values';
import type { SubstitutionFields } from './api';
import { draftOf, emptyRule, readRule, ruleTypes } from './ruleDraft';

/** A substitution as its form holds it. */
export const SubstitutionValues = z.object({
  toMovementId: z
    .string()
    .nullable()
    .refine((id) => id !== null, 'Choose a movement.'),
  /** `space`, `ability`, or the id of the missing kit item */
  lack: z.string().min(1, 'Say what is missing.'),
  rule: z
    .object({
      type: z.enum(ruleTypes.map(({ value }) => value)),
      factor: z.string(),
      secondsPerRep: z.string(),
      cap: z.string(),
      dose: z.string(),
    })
    .superRefine((draft, context) => {
      const read = readRule(draft);
      if ('fault' in read) context.addIssue({ code: 'custom', path: [read.field], message: read.fault });
    }),
  reason: shortText(200),
});
export type SubstitutionValues = z.input<typeof SubstitutionValues>;

/** @param lack what is most likely missing: the kit that the movement needs */
export const emptySubstitution = (lack: string): SubstitutionValues => ({
  toMovementId: null,
  lack,
  rule: emptyRule,
  reason: '',
});

export const substitutionValuesOf = ({
  to,
  missing,
  missingKitItemId,
  doseRule,
  reason,
}: Substitution): SubstitutionValues => ({
  toMovementId: to.id,
  lack: missing === 'kit' ? (missingKitItemId ?? '') : missing,
  rule: draftOf(doseRule),
  reason,
});

/** What is sent, of values that the schema has passed. */
export function substitutionFieldsOf({ toMovementId, lack, rule, reason }: SubstitutionValues): SubstitutionFields {
  const isKit = lack !== 'space' && lack !== 'ability';
  return {
    toMovementId: toMovementId ?? '',
    missing: isKit ? 'kit' : lack,
    missingKitItemId: isKit ? lack : null,
    doseRule: readRule(rule) as DoseRule,
    reason,
  };
}
