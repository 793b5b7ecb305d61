import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { KitItem } from '../../shared/contracts/kit';
import { Button } from '../components/Button';
import { EmptyState } from '../components/EmptyState';
import { GoButton } from '../components/GoButton';
import { PageTitle } from '../components/PageTitle';
import { Table } from '../components/Table';
import { KitItemDialog } from '../features/kit/KitItemDialog';
import { kitQuery } from '../lib/libraryQueries';
import { useTeam } from '../lib/session';

export function KitPage() {
  const { slug } = useTeam();
  const { data: items } = useSuspenseQuery(kitQuery(slug));
  const [open, setOpen] = useState<KitItem | 'new' | null>(null);
  return (
    <div className="space-y-4">
      <PageTitle
        title="Kit"
        meta="what movements may ask for"
        actions={
          <GoButton size="small" onClick={() => setOpen('new')}>
            Add an item
          </GoButton>
        }
      />
      {items.length === 0 ? (
        <EmptyState title="No kit yet.">
          Name what your members may have: dumbbell, rope, a bar to hang from. Movements then say what they need.
        </EmptyState>
      ) : (
        <Table
          caption="Kit items"
          rows={items}
          rowKey={(item) => item.id}
          columns={[
            { key: 'name', head: 'Item', role: 'name', cell: (item) => item.name },
            { key: 'others', head: 'Other names', cell: (item) => item.otherNames.join(', ') || '–' },
            { key: 'without', head: 'When missing', cell: (item) => item.withoutText },
            { key: 'load', head: 'Load', cell: (item) => (item.loadMatters ? 'matters' : '–') },
            {
              key: 'change',
              head: 'Change',
              headShown: 'hidden',
              align: 'end',
              cell: (item) => (
                <Button size="small" onClick={() => setOpen(item)} aria-label={`Change ${item.name}`}>
                  Change
                </Button>
              ),
            },
          ]}
        />
      )}
      {open && (
        <KitItemDialog
          key={open === 'new' ? 'new' : open.id}
          team={slug}
          item={open === 'new' ? null : open}
          onClose={() => setOpen(null)}
        />
      )}
    </div>
  );
}
