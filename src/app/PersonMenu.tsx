import { useMutation } from '@tanstack/react-query';
import { signOut } from '../../shared/contracts/account';
import { may } from '../../shared/domain/permissions';
import { Menu } from '../components/Menu';
import { ThemeChoice } from '../components/ThemeChoice';
import { call } from '../lib/api';
import { teamPath, useChangeOfPerson, useMe, useTeam } from '../lib/session';

/** Team and person at the end of the bar: other teams, the other room, account, sign out. */
export function PersonMenu({ room }: { room: 'floor' | 'desk' }) {
  const me = useMe();
  const team = useTeam();
  const changePerson = useChangeOfPerson();
  const leave = useMutation({ mutationFn: () => call(signOut, {}), onSuccess: () => changePerson(null) });
  if (!me) return null;
  const otherTeams = me.teams.filter((mine) => mine.slug !== team.slug);
  const firstName = me.name.split(' ')[0] ?? me.name;
  return (
    <Menu
      name={`${team.name}, ${me.name}: menu`}
      className="max-md:-me-2 max-md:px-2!"
      label={
        <span className="flex min-w-0 items-baseline gap-1.5">
          {/* beside a bar of places there is no room for it below this width; the menu says it */}
          <span className="hidden truncate text-ink2 min-[1100px]:inline">{team.name}</span>
          <span className="truncate font-bold">{firstName}</span>
        </span>
      }
      items={[
        ...(room === 'floor'
          ? may(team.role, 'readDrafts')
            ? ([{ label: 'To the desk', icon: 'desk', to: teamPath(team.slug, 'sessions') }] as const)
            : []
          : ([{ label: 'To the floor, as members see it', icon: 'floor', to: teamPath(team.slug, 'today') }] as const)),
        ...otherTeams.map((other) => ({
          label: `Go to ${other.name}`,
          icon: 'swap' as const,
          to: teamPath(other.slug),
        })),
        { label: 'Notices', icon: 'bell', to: teamPath(team.slug, 'notices') },
        { label: 'Your account', icon: 'person', to: '/account' },
        { label: 'Sign out', icon: 'signOut', onSelect: () => leave.mutate() },
      ]}
    >
      <p className="mb-2 text-sm text-ink2 wrap-anywhere min-[1100px]:hidden">{team.name}</p>
      <ThemeChoice />
    </Menu>
  );
}
