import { useState } from 'react';
import type { Movement, Substitution } from '../../../shared/contracts/movements';
import { explainRule } from '../../../shared/domain/kit/convertDose';
import { Button } from '../../components/Button';
import { EmptyState } from '../../components/EmptyState';
import { FormFault } from '../../components/FormFault';
import { IconButton } from '../../components/IconButton';
import { Section } from '../../components/PageTitle';
import { Table } from '../../components/Table';
import { TextButton, TextLink } from '../../components/TextLink';
import { teamPath } from '../../lib/session';
import { useAddSubstitution, useRemoveSubstitution } from './api';
import { type KitById, lackWords } from './kitWords';
import { SubstitutionDialog } from './SubstitutionDialog';

type Props = { team: string; movement: Movement; substitutions: readonly Substitution[]; kit: KitById };

/** What to do instead; each change is kept at once. */
export function SubstitutionTable({ team, movement, substitutions, kit }: Props) {
  const [open, setOpen] = useState<Substitution | 'new' | null>(null);
  const [removed, setRemoved] = useState<Substitution | null>(null);
  const remove = useRemoveSubstitution(team, movement.id);
  const putBack = useAddSubstitution(team, movement.id);
  const takeOut = (substitution: Substitution) => {
    putBack.reset();
    remove.mutate(substitution.id, { onSuccess: () => setRemoved(substitution) });
  };
  const bringBack = ({ to, missing, missingKitItemId, doseRule, reason }: Substitution) =>
    putBack.mutate(
      { toMovementId: to.id, missing, missingKitItemId, doseRule, reason },
      { onSuccess: () => setRemoved(null) },
    );

  return (
    <Section
      title="Instead of it"
      actions={
        <Button size="small" onClick={() => setOpen('new')}>
          Add a substitution
        </Button>
      }
    >
      {substitutions.length === 0 ? (
        <EmptyState title="Nothing yet to do instead.">
          {movement.kitNeeded.length > 0
            ? 'Members without the kit are told to ask. Say what they do instead, and how much of it.'
            : 'Say what to do when space or ability is missing.'}
        </EmptyState>
      ) : (
        <Table
          caption={`What to do instead of ${movement.name}`}
          rows={substitutions}
          rowKey={({ id }) => id}
          columns={[
            {
              key: 'to',
              head: 'Do instead',
              role: 'name',
              cell: ({ to }) => <TextLink to={teamPath(team, 'movements', to.id)}>{to.name}</TextLink>,
            },
            { key: 'lack', head: 'When missing', cell: (one) => lackWords(one, kit) },
            { key: 'rule', head: 'How much', cell: ({ doseRule }) => explainRule(doseRule) },
            { key: 'reason', head: 'Reason', cell: ({ reason }) => reason },
            {
              key: 'tools',
              head: 'Change',
              headShown: 'hidden',
              align: 'end',
              cell: (one) => (
                <span className="-my-1.5 flex gap-1 md:justify-end">
                  <IconButton
                    icon="edit"
                    label={`Change ${one.to.name}, ${lackWords(one, kit)}`}
                    look="quiet"
                    size="small"
                    onClick={() => setOpen(one)}
                  />
                  <IconButton
                    icon="trash"
                    label={`Remove ${one.to.name}, ${lackWords(one, kit)}`}
                    look="quiet"
                    size="small"
                    disabled={remove.isPending}
                    onClick={() => takeOut(one)}
                  />
                </span>
              ),
            },
          ]}
        />
      )}
      <p role="status" className="mt-2 text-sm text-ink2 empty:hidden">
        {removed && (
          <>
            “{removed.to.name}, {lackWords(removed, kit)}” was removed.{' '}
            <TextButton onClick={() => bringBack(removed)}>Put it back</TextButton>
          </>
        )}
      </p>
      <FormFault>{remove.error?.message ?? putBack.error?.message}</FormFault>
      {open && (
        <SubstitutionDialog
          key={open === 'new' ? 'new' : open.id}
          team={team}
          movement={movement}
          kit={kit}
          substitution={open === 'new' ? null : open}
          onClose={() => setOpen(null)}
        />
      )}
    </Section>
  );
}
