import { clsx } from 'clsx';
import type { ReactNode } from 'react';
import { formatCount } from '../../lib/format';
import type { MovementPage } from './api';
import { type KitById, kitWords } from './kitWords';

type Props = { page: MovementPage; kit: KitById; state: 'stays' | 'goes'; onChoose: () => void };

/** One of the two, with all that helps to decide; the whole of it chooses it. */
export function MergeSide({ page, kit, state, onChoose }: Props) {
  const { movement, moments, substitutions, standsInFor } = page;
  return (
    <label
      className={clsx(
        'block rounded border-2 p-3 has-[:focus-visible]:outline-3 has-[:focus-visible]:outline-offset-2 has-[:focus-visible]:outline-ink',
        state === 'stays' ? 'border-ink bg-tint' : 'border-line',
      )}
    >
      <span className="flex items-start gap-3">
        <input
          type="radio"
          name="stays"
          className="mt-0.5 size-5.5 flex-none accent-ink focus-visible:outline-none"
          checked={state === 'stays'}
          onChange={onChoose}
        />
        <span className="min-w-0">
          <span className="block text-md font-extrabold wrap-anywhere">{movement.name}</span>
          <span className={clsx('block text-sm font-bold', state === 'stays' ? 'text-good' : 'text-danger')}>
            {state === 'stays' ? 'stays' : 'becomes another name'}
          </span>
        </span>
      </span>
      <span className="mt-2 block space-y-1.5 text-sm">
        <Fact name="Other names">{movement.otherNames.join(', ') || 'none'}</Fact>
        <Fact name="Pattern">{movement.pattern}</Fact>
        <Fact name="Kit needed">{kitWords(movement.kitNeeded, kit) || 'nothing'}</Fact>
        <Fact name="Shown in">
          {formatCount(moments.length, 'chapter', 'chapters')}
          {moments.slice(0, 3).map((moment) => (
            <span key={moment.chapterId} className="block text-ink2">
              {moment.title}
            </span>
          ))}
        </Fact>
        <Fact name="Substitutions">
          {substitutions.length} instead of it, stands in for {standsInFor.length}
        </Fact>
        <Fact name="Points">
          <Lines lines={movement.points} />
        </Fact>
        <Fact name="Faults">
          <Lines lines={movement.faults} />
        </Fact>
        <Fact name="Cautions">
          <Lines lines={movement.cautions.map(({ say }) => say)} />
        </Fact>
      </span>
    </label>
  );
}

const Fact = ({ name, children }: { name: string; children: ReactNode }) => (
  <span className="grid grid-cols-[6.5rem_minmax(0,1fr)] gap-2">
    <span className="text-ink2">{name}</span>
    <span className="wrap-anywhere">{children}</span>
  </span>
);

const Lines = ({ lines }: { lines: readonly string[] }) =>
  lines.length === 0
    ? 'none'
    : lines.map((line) => (
        <span key={line} className="block">
          {line}
        </span>
      ));
