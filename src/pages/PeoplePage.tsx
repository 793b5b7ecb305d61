import { useSuspenseInfiniteQuery, useSuspenseQuery } from '@tanstack/react-query';
import { MoreButton } from '../components/MoreButton';
import { PageTitle, Section } from '../components/PageTitle';
import { TextLink } from '../components/TextLink';
import { invitationsQuery, peopleQuery, teamQuery } from '../features/people/api';
import { InvitationList } from '../features/people/InvitationList';
import { InviteForm } from '../features/people/InviteForm';
import { PeopleTable } from '../features/people/PeopleTable';
import { TeamForm } from '../features/people/TeamForm';
import { formatCount } from '../lib/format';
import { teamPath, useMe, useTeam } from '../lib/session';

export function PeoplePage() {
  const { slug } = useTeam();
  const me = useMe();
  const people = useSuspenseInfiniteQuery(peopleQuery(slug));
  const { data: invitations } = useSuspenseQuery(invitationsQuery(slug));
  const { data: team } = useSuspenseQuery(teamQuery(slug));
  const everybody = people.data.pages.flatMap((page) => page.items);
  return (
    <div className="space-y-8">
      <PageTitle
        title="People"
        meta={people.hasNextPage ? undefined : formatCount(everybody.length, 'person', 'people')}
        actions={<TextLink to={teamPath(slug, 'trail')}>What was changed, and by whom</TextLink>}
      />
      <Section title="Invite somebody">
        <InviteForm team={slug} />
      </Section>
      <Section title="In the team">
        <PeopleTable team={slug} people={everybody} myId={me?.id ?? ''} />
        <MoreButton query={people} />
      </Section>
      <Section title="Invited">
        <InvitationList team={slug} timeZone={team.timeZone} invitations={invitations.items} />
      </Section>
      <Section title="The team">
        <TeamForm team={slug} name={team.name} timeZone={team.timeZone} />
      </Section>
    </div>
  );
}
