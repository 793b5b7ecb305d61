import { useState } from 'react';
import type { Moment } from '../../../shared/contracts/moments';
import { formatMs } from '../../../shared/domain/timecode';
import { Button } from '../../components/Button';
import { MediaRow } from '../../components/MediaRow';
import { formatDate } from '../../lib/format';
import { momentPath } from '../../lib/momentPath';

type Props = { team: string; moments: readonly Moment[]; size: 'small' | 'large' };

/** More than a screen of them are shown on request. */
const atFirst = 8;

/** The moments that show a movement, newest first; a press plays it. */
export function MomentRows({ team, moments, size }: Props) {
  const [shown, setShown] = useState<'some' | 'all'>('some');
  const rows = shown === 'all' ? moments : moments.slice(0, atFirst);
  return (
    <>
      <ul>
        {rows.map((moment) => (
          <MediaRow
            key={moment.chapterId}
            size={size}
            title={moment.title}
            to={momentPath(team, moment)}
            still={{ src: moment.pictureUrl, length: formatMs(moment.endMs - moment.startMs) }}
            tape={moment.kind}
            notes={[
              moment.standsInFor &&
                `instead of ${moment.standsInFor.name}${moment.missingText ? ` · ${moment.missingText}` : ''}`,
              momentPlace(moment),
            ]}
          />
        ))}
      </ul>
      {rows.length < moments.length && (
        <Button className="mt-1" onClick={() => setShown('all')}>
          Show all {moments.length}
        </Button>
      )}
    </>
  );
}

/** “demo · Dario, Tue 3 March · Step, row, skip”. */
export const momentPlace = ({ kind, coach, session }: Moment): string =>
  [kind, [coach, session && formatDate(session.date)].filter(Boolean).join(', '), session?.title]
    .filter(Boolean)
    .join(' · ');
