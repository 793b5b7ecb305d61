import { useFormContext } from 'react-hook-form';
import { convertDose, explainRule } from '../../../shared/domain/kit/convertDose';
import { Dose, formatDose } from '../../../shared/domain/training/dose';
import { SelectField, TextField } from '../../components/TextField';
import { readRule, ruleTypes } from './ruleDraft';
import type { SubstitutionValues } from './substitutionValues';

/** Plans speak of this many most often. */
const example = Dose.parse({ amount: 10, unit: 'reps' });

/** How the planned dose becomes the dose of what is done instead, with what it makes of ten reps. */
export function DoseRuleFields() {
  const { register, watch, formState } = useFormContext<SubstitutionValues>();
  const errors = formState.errors.rule;
  const draft = watch('rule');
  const rule = readRule(draft);
  return (
    <div className="grid gap-3">
      <SelectField label="How much of it" options={ruleTypes} {...register('rule.type')} />
      {(draft.type === 'times' || draft.type === 'secondsForReps') && (
        <div className="grid grid-cols-2 gap-3">
          {draft.type === 'times' ? (
            <TextField
              label="Times the count"
              inputMode="decimal"
              error={errors?.factor?.message}
              {...register('rule.factor')}
            />
          ) : (
            <TextField
              label="Seconds for each rep"
              inputMode="decimal"
              error={errors?.secondsPerRep?.message}
              {...register('rule.secondsPerRep')}
            />
          )}
          <TextField
            label={draft.type === 'times' ? 'At most' : 'At most, in seconds'}
            optional
            inputMode="decimal"
            error={errors?.cap?.message}
            {...register('rule.cap')}
          />
        </div>
      )}
      {draft.type === 'fixed' && (
        <TextField
          label="The dose"
          placeholder="20 s, 8 / side, 12 at 8 kg"
          autoComplete="off"
          error={errors?.dose?.message}
          {...register('rule.dose')}
        />
      )}
      <p role="status" className="text-sm text-ink2">
        {'type' in rule ? (
          <>
            Members read “{explainRule(rule)}”: 10 reps become <strong>{formatDose(convertDose(example, rule))}</strong>
            .
          </>
        ) : (
          'Fill it in to see what 10 reps become.'
        )}
      </p>
    </div>
  );
}
