import type { Substitution } from '../../../shared/contracts/movements';
import { explainRule } from '../../../shared/domain/kit/convertDose';
import { MediaRow } from '../../components/MediaRow';
import { type KitById, lackWords } from './kitWords';

type Props = {
  standsInFor: readonly Substitution[];
  kit: KitById;
  /** the page of a movement in this room */
  pathOf: (movementId: string) => string;
};

/** What a movement is done instead of. */
export function StandsInFor({ standsInFor, kit, pathOf }: Props) {
  return (
    <ul>
      {standsInFor.map((one) => (
        <MediaRow
          key={one.id}
          title={one.from.name}
          to={pathOf(one.from.id)}
          still={null}
          notes={[`${lackWords(one, kit)} · ${explainRule(one.doseRule)}`]}
        />
      ))}
    </ul>
  );
}
