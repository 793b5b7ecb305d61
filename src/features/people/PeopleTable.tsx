import { useState } from 'react';
import type { TeamPerson } from '../../../shared/contracts/people';
import type { Role } from '../../../shared/domain/words';
import { Button } from '../../components/Button';
import { ConfirmDialog } from '../../components/ConfirmDialog';
import { FormFault } from '../../components/FormFault';
import { Table } from '../../components/Table';
import { SelectField } from '../../components/TextField';
import { announce } from '../../lib/announce';
import { formatDate } from '../../lib/format';
import { useChangeRole, useRemovePerson } from './api';
import { roleOptions, roleWords } from './roleWords';

/** Everybody in the team: a role counts from the person's next request on. */
export function PeopleTable({ team, people, myId }: { team: string; people: readonly TeamPerson[]; myId: string }) {
  const changeRole = useChangeRole(team);
  const [leaving, setLeaving] = useState<TeamPerson | null>(null);
  const change = (person: TeamPerson, role: Role) =>
    changeRole.mutate(
      { personId: person.id, role },
      { onSuccess: () => announce(`${person.name} is ${roleWords[role].name.toLowerCase()} now`) },
    );
  return (
    <>
      <FormFault>{changeRole.error?.message}</FormFault>
      <Table
        caption="People in the team"
        lines="one"
        rows={people}
        rowKey={(person) => person.id}
        columns={[
          {
            key: 'name',
            head: 'Name',
            role: 'name',
            cell: (person) => (person.id === myId ? `${person.name} (you)` : person.name),
          },
          { key: 'email', head: 'E-mail', cell: (person) => <span className="wrap-anywhere">{person.email}</span> },
          {
            key: 'role',
            head: 'Role',
            width: 'w-40',
            cell: (person) => (
              <SelectField
                label={`Role of ${person.name}`}
                labelled="hidden"
                options={roleOptions}
                value={person.role}
                disabled={changeRole.isPending}
                onChange={(event) => change(person, event.target.value as Role)}
              />
            ),
          },
          { key: 'since', head: 'Here since', role: 'figure', cell: (person) => formatDate(person.since.slice(0, 10)) },
          {
            key: 'leave',
            head: 'Take out',
            headShown: 'hidden',
            align: 'end',
            cell: (person) => (
              <Button
                size="small"
                className="whitespace-nowrap"
                onClick={() => setLeaving(person)}
                aria-label={`Take ${person.name} out of the team`}
              >
                Take out
              </Button>
            ),
          },
        ]}
      />
      {leaving && <TakeOut team={team} person={leaving} onClose={() => setLeaving(null)} />}
    </>
  );
}

function TakeOut({ team, person, onClose }: { team: string; person: TeamPerson; onClose: () => void }) {
  const remove = useRemovePerson(team);
  return (
    <ConfirmDialog
      open
      title={`Take ${person.name} out of the team?`}
      confirm="Take out"
      busy={remove.isPending ? 'Taking out' : undefined}
      error={remove.error?.message}
      onConfirm={() =>
        remove.mutate(person.id, {
          onSuccess: () => {
            announce(`${person.name} was taken out of the team`);
            onClose();
          },
        })
      }
      onClose={onClose}
    >
      They see nothing of the team from now on. What they made stays. You can invite them again.
    </ConfirmDialog>
  );
}
