import type { Substitution } from '../../../shared/contracts/movements';
import { explainRule } from '../../../shared/domain/kit/convertDose';
import { MediaRow } from '../../components/MediaRow';
import { teamPath } from '../../lib/session';
import { type KitById, lackWords } from './kitWords';

type Props = { team: string; substitutions: readonly Substitution[]; kit: KitById };

/** What to do instead, by what is missing. */
export function InsteadRows({ team, substitutions, kit }: Props) {
  return (
    <ul>
      {substitutions.map((one) => (
        <MediaRow
          key={one.id}
          title={one.to.name}
          to={teamPath(team, 'dictionary', one.to.id)}
          still={null}
          tape="substitution"
          notes={[
            <span key="lack" className="text-ink">
              {lackWords(one, kit)} · {explainRule(one.doseRule)}
            </span>,
            one.reason,
          ]}
        />
      ))}
    </ul>
  );
}
