import { Link } from 'react-router-dom';
import type { Watch } from '../../../shared/contracts/watch';
import { Icon } from '../../components/Icon';
import { Section } from '../../components/PageTitle';
import { teamPath } from '../../lib/session';

/** The other recordings of the same session. */
export function Takes({ team, takes }: { team: string; takes: Watch['takes'] }) {
  if (takes.length === 0) return null;
  return (
    <Section title="Also from this session" place="aside">
      <ul>
        {takes.map(({ recordingId, title, take }) => (
          <li key={recordingId} className="border-b border-line">
            <Link
              to={teamPath(team, 'watch', recordingId)}
              className="-mx-2 flex min-h-12 items-center gap-3 px-2 py-1.5 no-underline hover:bg-surface"
            >
              <Icon name="film" size={20} className="text-ink2" />
              <span className="min-w-0 grow wrap-anywhere">{title}</span>
              <span className="flex-none text-sm text-ink2">take {take}</span>
            </Link>
          </li>
        ))}
      </ul>
    </Section>
  );
}
