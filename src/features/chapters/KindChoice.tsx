import { clsx } from 'clsx';
import { useId } from 'react';
import { type ChapterKind, chapterKinds } from '../../../shared/domain/words';
import { Key } from '../../components/Key';
import { TapeStrip } from '../../components/TapeStrip';
import { kindKeys, kindNames } from './chapterNames';

/** What a chapter shows, chosen by its tape. */
export function KindChoice({ kind, onChange }: { kind: ChapterKind; onChange: (kind: ChapterKind) => void }) {
  const name = useId();
  return (
    <fieldset>
      <legend className="mb-1 text-sm font-bold">Kind</legend>
      <div className="grid grid-cols-2 gap-1 @sm:grid-cols-3 @xl:grid-cols-5">
        {chapterKinds.map((one) => (
          <label
            key={one}
            className={clsx(
              'flex min-h-targetSmall items-center gap-1.5 rounded border-thin px-1.5 py-1 text-sm leading-tight has-focus-visible:outline-3 has-focus-visible:outline-ink',
              one === kind ? 'border-ink bg-surface font-extrabold' : 'border-transparent hover:bg-raised',
            )}
          >
            <input type="radio" name={name} className="sr-only" checked={one === kind} onChange={() => onChange(one)} />
            <TapeStrip kind={one} className="w-6" />
            <span className="min-w-0 grow">{kindNames[one]}</span>
            <Key name={kindKeys[one]} />
          </label>
        ))}
      </div>
    </fieldset>
  );
}
