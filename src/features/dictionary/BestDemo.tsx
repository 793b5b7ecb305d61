import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { Moment } from '../../../shared/contracts/moments';
import type { Movement } from '../../../shared/contracts/movements';
import { formatMs } from '../../../shared/domain/timecode';
import { GoLink } from '../../components/GoButton';
import { Icon } from '../../components/Icon';
import { Still } from '../../components/Still';
import { TapeStrip } from '../../components/TapeStrip';
import { momentPath } from '../../lib/momentPath';
import { momentPlace } from './MomentRows';

/** The newest demo; a substitution shows the movement as well, anything else only in passing. */
export const bestDemo = (moments: readonly Moment[]): Moment | undefined =>
  moments.find(({ kind }) => kind === 'demo') ?? moments.find(({ kind }) => kind === 'substitution') ?? moments[0];

type Props = { team: string; movement: Movement; moment: Moment | undefined; children: ReactNode };

/** The picture first; a press plays the demo. Where nothing shows the movement, its own picture, if it has one. */
export function BestDemo({ team, movement, moment, children }: Props) {
  const src = movement.pictureUrl ?? moment?.pictureUrl ?? null;
  if (!moment)
    return (
      <>
        {src && <Still src={src} alt={movement.name} loading="eager" className="w-full md:max-w-xl" />}
        <div className="pt-3">{children}</div>
      </>
    );
  const length = formatMs(moment.endMs - moment.startMs);
  return (
    <>
      {/* the button below leads to the same place: one stop of the Tab key is enough */}
      <Link
        to={momentPath(team, moment)}
        tabIndex={-1}
        aria-hidden="true"
        className="relative -mx-4.5 block md:mx-0 md:max-w-xl"
      >
        <Still src={src} length={length} loading="eager" className="w-full" />
        <span className="absolute inset-0 m-auto flex size-16 items-center justify-center rounded bg-shade text-onShade">
          <Icon name="play" size={30} fill="filled" />
        </span>
      </Link>
      <div className="mt-2 flex items-center gap-3">
        <TapeStrip kind={moment.kind} className="w-18" />
        <p className="min-w-0 text-sm text-ink2">{momentPlace(moment)}</p>
      </div>
      <div className="pt-3">{children}</div>
      <GoLink to={momentPath(team, moment)} size="large" className="mt-4 w-full sm:w-auto">
        {moment.kind === 'demo' ? 'Watch the demo' : 'Watch it'} · {length}
      </GoLink>
    </>
  );
}
