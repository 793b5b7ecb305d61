import type { MovementInList } from '../../../shared/contracts/movements';
import { MediaRow } from '../../components/MediaRow';
import { teamPath } from '../../lib/session';
import { type KitById, kitWords } from './kitWords';

type Props = { team: string; movements: readonly MovementInList[]; kit: KitById };

/** The floor's list: a picture, the name, what it needs. */
export function MovementRows({ team, movements, kit }: Props) {
  return (
    <ul>
      {movements.map((movement) => (
        <MediaRow
          key={movement.id}
          title={movement.name}
          to={teamPath(team, 'dictionary', movement.id)}
          still={{ src: movement.pictureUrl }}
          notes={[
            kitWords(movement.kitNeeded, kit) || 'no kit needed',
            movement.demoCount === 0 ? `${movement.pattern} · not filmed yet` : movement.pattern,
          ]}
          {...(movement.demoCount > 0 ? { tape: 'demo' as const } : {})}
        />
      ))}
    </ul>
  );
}
