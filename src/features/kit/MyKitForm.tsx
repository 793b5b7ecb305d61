import { useState } from 'react';
import type { KitItem } from '../../../shared/contracts/kit';
import type { OwnedKit } from '../../../shared/domain/kit/kit';
import { FormFault } from '../../components/FormFault';
import { GoButton } from '../../components/GoButton';
import { IconButton } from '../../components/IconButton';
import { StickyAction } from '../../components/StickyAction';
import { TextField } from '../../components/TextField';
import { announce } from '../../lib/announce';
import { useSaveMyKit } from './api';
import { loadsText, readLoads, withLoads } from './myKitText';

type Props = { team: string; items: readonly KitItem[]; mine: readonly OwnedKit[]; onSaved: () => void };

/** What a member has, item by item, with how many and how heavy. */
export function MyKitForm({ team, items, mine, onSaved }: Props) {
  const [owned, setOwned] = useState(() => new Map(mine.map((one) => [one.kitItemId, one])));
  const [typed, setTyped] = useState(() => new Map(mine.map((one) => [one.kitItemId, loadsText(one.loadsKg)])));
  const save = useSaveMyKit(team);
  const change = (id: string, next: OwnedKit | null) => {
    const changed = new Map(owned);
    next ? changed.set(id, next) : changed.delete(id);
    setOwned(changed);
  };
  const faults = new Map(
    [...typed].flatMap(([id, text]) => {
      const read = readLoads(text);
      return owned.has(id) && 'fault' in read ? [[id, read.fault] as const] : [];
    }),
  );
  const submit = () => {
    if (faults.size > 0) return;
    save.mutate([...owned.values()], {
      onSuccess: () => {
        announce('Your kit is saved');
        onSaved();
      },
    });
  };

  return (
    <form
      noValidate
      className="flex grow flex-col"
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <ul className="mb-6">
        {items.map((item) => (
          <OwnedRow
            key={item.id}
            item={item}
            owned={owned.get(item.id) ?? null}
            loads={typed.get(item.id) ?? ''}
            fault={faults.get(item.id)}
            onChange={(next) => change(item.id, next)}
            onLoads={(text) => {
              setTyped(new Map(typed).set(item.id, text));
              const current = owned.get(item.id);
              const read = readLoads(text);
              if (current && Array.isArray(read)) change(item.id, withLoads(current, read));
            }}
          />
        ))}
      </ul>
      <FormFault>{save.error?.message}</FormFault>
      <StickyAction>
        <GoButton type="submit" size="large" className="w-full" busy={save.isPending ? 'Saving' : undefined}>
          {owned.size === 0 ? 'I have none of these' : 'This is my kit'}
        </GoButton>
      </StickyAction>
    </form>
  );
}

type RowProps = {
  item: KitItem;
  owned: OwnedKit | null;
  loads: string;
  fault: string | undefined;
  onChange: (next: OwnedKit | null) => void;
  onLoads: (text: string) => void;
};

function OwnedRow({ item, owned, loads, fault, onChange, onLoads }: RowProps) {
  const count = owned?.count ?? 0;
  const setCount = (next: number) =>
    onChange(
      next <= 0
        ? null
        : { kitItemId: item.id, count: Math.min(50, next), loadsKg: (owned?.loadsKg ?? []).slice(0, next) },
    );
  return (
    <li className="border-b border-line py-2">
      <div className="flex items-center gap-3">
        <span className="min-w-0 grow">
          <span className="block font-extrabold wrap-anywhere">{item.name}</span>
          {item.otherNames.length > 0 && (
            <span className="block text-sm text-ink2">{item.otherNames.slice(0, 3).join(', ')}</span>
          )}
        </span>
        <span className="flex flex-none items-center gap-1">
          <IconButton
            icon="remove"
            label={`One ${item.name} less`}
            disabled={count === 0}
            onClick={() => setCount(count - 1)}
          />
          <output aria-label={`${item.name}, how many`} className="w-8 text-center text-lg font-extrabold">
            {count}
          </output>
          <IconButton
            icon="add"
            label={`One ${item.name} more`}
            disabled={count === 50}
            onClick={() => setCount(count + 1)}
          />
        </span>
      </div>
      {item.loadMatters && owned && (
        <TextField
          className="mt-2 max-w-80"
          label={`${item.name}: loads in kg`}
          optional
          hint="One number each, like 12 16 16. Leave it empty if you don’t know."
          inputMode="decimal"
          value={loads}
          error={fault}
          onChange={(event) => onLoads(event.target.value)}
        />
      )}
    </li>
  );
}
