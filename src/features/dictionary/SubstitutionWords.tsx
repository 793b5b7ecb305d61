import type { Substitution } from '../../../shared/contracts/movements';
import { explainRule } from '../../../shared/domain/kit/convertDose';
import { type KitById, lackWords } from './kitWords';

/** A substitution in two lines. @param movement the one of the two that is named */
export function SubstitutionWords({
  substitution,
  movement,
  kit,
}: {
  substitution: Substitution;
  movement: { name: string };
  kit: KitById;
}) {
  return (
    <>
      <strong className="font-extrabold">{movement.name}</strong>
      <span className="block text-ink2">
        {lackWords(substitution, kit)} · {explainRule(substitution.doseRule)}
      </span>
      <span className="block text-ink2">{substitution.reason}</span>
    </>
  );
}
