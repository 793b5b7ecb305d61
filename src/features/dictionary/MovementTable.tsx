import type { MovementInList } from '../../../shared/contracts/movements';
import { type Column, Table } from '../../components/Table';
import { TextLink } from '../../components/TextLink';
import { teamPath } from '../../lib/session';
import { type KitById, kitWords } from './kitWords';
import type { MergeChoice } from './useMergeChoice';

type Props = { team: string; movements: readonly MovementInList[]; kit: KitById; merging: MergeChoice };

export function MovementTable({ team, movements, kit, merging }: Props) {
  const { chosen } = merging;
  return (
    <Table
      caption="Movements"
      rows={movements}
      rowKey={({ id }) => id}
      rowState={({ id }) => (chosen?.includes(id) ? 'at' : 'plain')}
      columns={[...(chosen ? [choiceColumn(merging)] : []), ...columnsFor(team, kit)]}
    />
  );
}

const columnsFor = (team: string, kit: KitById): Column<MovementInList>[] => [
  {
    key: 'name',
    head: 'Movement',
    role: 'name',
    cell: ({ id, name, otherNames }) => (
      <>
        <TextLink to={teamPath(team, 'movements', id)} className="text-base wrap-anywhere">
          {name}
        </TextLink>
        {otherNames.length > 0 && (
          <span className="block font-normal text-ink2 wrap-anywhere">also {otherNames.join(', ')}</span>
        )}
      </>
    ),
  },
  { key: 'pattern', head: 'Pattern', width: 'w-36', cell: ({ pattern }) => pattern },
  { key: 'kit', head: 'Kit needed', cell: ({ kitNeeded }) => kitWords(kitNeeded, kit) || 'nothing' },
  {
    key: 'demos',
    head: 'Demos',
    width: 'w-40',
    cell: ({ demoCount }) =>
      demoCount > 0 ? (
        <span className="font-bold">{demoCount >= 1000 ? '1000+' : demoCount}</span>
      ) : (
        <strong className="text-danger">none yet: film it</strong>
      ),
  },
];

const choiceColumn = ({ chosen, toggle }: MergeChoice): Column<MovementInList> => ({
  key: 'choose',
  head: 'Choose',
  width: 'w-16',
  cell: ({ id, name }) => {
    const isChosen = chosen?.includes(id) ?? false;
    return (
      <label className="-my-1 flex min-h-targetSmall items-center gap-3">
        <input
          type="checkbox"
          className="size-5.5 accent-ink"
          checked={isChosen}
          disabled={!isChosen && chosen?.length === 2}
          onChange={() => toggle(id)}
        />
        <span className="sr-only">{name} is one of the two</span>
      </label>
    );
  },
});
