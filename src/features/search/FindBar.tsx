import { useLocation, useNavigate } from 'react-router-dom';
import { teamPath } from '../../lib/session';
import { FindBox } from './FindBox';

/** The box in the floor's top bar; the search page has its own. */
export function FindBar({ team }: { team: string }) {
  const navigate = useNavigate();
  const { pathname } = useLocation();
  if (pathname === teamPath(team, 'find')) return null;
  return (
    <FindBox
      key={pathname}
      team={team}
      place="bar"
      onFind={(q) => navigate(`${teamPath(team, 'find')}?q=${encodeURIComponent(q)}`)}
    />
  );
}
