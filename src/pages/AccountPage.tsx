import { useState } from 'react';
import { Button } from '../components/Button';
import { ConfirmDialog } from '../components/ConfirmDialog';
import { PageTitle, Section } from '../components/PageTitle';
import { TextLink } from '../components/TextLink';
import { ThemeChoice } from '../components/ThemeChoice';
import { NameForm, PasswordForm } from '../features/account/AccountForms';
import { useSignOutEverywhere } from '../features/account/api';
import { teamPath, useMe } from '../lib/session';

const roleWords = { owner: 'owner', coach: 'coach', editor: 'editor', member: 'member' } as const;

export function AccountPage() {
  const me = useMe();
  const leave = useSignOutEverywhere();
  const [asking, setAsking] = useState<'no' | 'yes'>('no');
  if (!me) return null;
  return (
    <div className="space-y-8">
      <PageTitle title="Your account" meta={me.email} />
      <Section title="Your teams">
        <ul>
          {me.teams.map((team) => (
            <li key={team.slug} className="flex items-baseline gap-3 border-b border-line py-2.5">
              <TextLink to={teamPath(team.slug)}>{team.name}</TextLink>
              <span className="ms-auto text-sm text-ink2">{roleWords[team.role]}</span>
            </li>
          ))}
        </ul>
        {me.teams.length === 0 && <p>You are in no team. The owner of one sends you an invitation by mail.</p>}
      </Section>
      <Section title="Name">
        <NameForm name={me.name} />
      </Section>
      <Section title="Password">
        <PasswordForm />
      </Section>
      <ThemeChoice />
      <Section title="Every device">
        <p className="mb-3">
          A phone that was lost, a computer that others use: sign out everywhere at once, here too.
        </p>
        <Button onClick={() => setAsking('yes')}>Sign out everywhere</Button>
      </Section>
      <ConfirmDialog
        open={asking === 'yes'}
        title="Sign out everywhere?"
        confirm="Sign out everywhere"
        cancel="Stay signed in"
        busy={leave.isPending ? 'Signing out' : undefined}
        error={leave.isError ? 'That did not arrive. Check the connection and try again.' : undefined}
        onConfirm={() => leave.mutate()}
        onClose={() => setAsking('no')}
      >
        Every device asks for the password again. What was saved stays saved.
      </ConfirmDialog>
    </div>
  );
}
