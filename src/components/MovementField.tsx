import { useMemo, useState } from 'react';
import { Combobox } from './Combobox';
import type { FieldTexts } from './Field';

export type MovementName = { id: string; name: string; otherNames: readonly string[] };

type Props = FieldTexts & {
  /** the team's whole dictionary, by name */
  movements: readonly MovementName[];
  value: string | null;
  onChange: (movement: { id: string; name: string } | null) => void;
  /** what was typed is not in the dictionary and shall be */
  onCreate?: (name: string) => void;
  placeholder?: string;
  className?: string;
};

/** More than fit a list would only have to be typed past. */
const offered = 30;

const plain = (text: string) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().trim();

type Hit = { movement: MovementName; by: string | null; first: number };

/** Movements whose name or other name holds every typed word; those that start with the text come first. */
function found(movements: readonly MovementName[], typed: string): Hit[] {
  const text = plain(typed);
  const words = text.split(/\s+/).filter(Boolean);
  const fits = (name: string) => words.every((word) => plain(name).includes(word));
  const hits = movements.flatMap((movement): Hit[] => {
    if (fits(movement.name)) return [{ movement, by: null, first: plain(movement.name).startsWith(text) ? 0 : 1 }];
    const by = movement.otherNames.find(fits);
    return by === undefined ? [] : [{ movement, by, first: plain(by).startsWith(text) ? 1 : 2 }];
  });
  return hits.toSorted((a, b) => a.first - b.first).slice(0, offered);
}

/** A movement of the dictionary, typed with completion over all of its names. */
export function MovementField({ movements, value, onChange, onCreate, placeholder, ...texts }: Props) {
  const [query, setQuery] = useState('');
  const options = useMemo(
    () =>
      found(movements, query).map(({ movement, by }) => ({
        value: movement.id,
        label: movement.name,
        ...(by ? { note: `also: ${by}` } : {}),
      })),
    [movements, query],
  );
  const chosen = movements.find(({ id }) => id === value);
  return (
    <Combobox
      {...texts}
      options={options}
      value={value}
      valueLabel={chosen?.name ?? (value === null ? '' : 'A movement that is gone')}
      placeholder={placeholder}
      onQuery={setQuery}
      onChange={(id, option) => {
        setQuery('');
        onChange(id === null || !option ? null : { id, name: option.label });
      }}
      {...(onCreate ? { onCreate, createLabel: 'Add to the dictionary' } : {})}
    />
  );
}
