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
      <div className="grid grid-cols-2 gap-1 @xs:grid-cols-3 @md:grid-cols-5">
        {chapterKinds.map((one) => (
          <label
            key={one}
            className={clsx(
              'grid min-h-target content-center gap-1 rounded border-thin px-1.5 py-1 text-sm leading-tight has-focus-visible:outline-3 has-focus-visible:outline-ink',
              one === kind ? 'border-ink bg-surface font-extrabold' : 'border-transparent hover:bg-raised',
            )}
          >
            <input type="radio" name={name} className="sr-only" checked={one === kind} onChange={() => onChange(one)} />
            <span className="flex items-center gap-1.5">
              <TapeStrip kind={one} className="w-8" />
              <Key name={kindKeys[one]} />
            </span>
            <span>{kindNames[one]}</span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}
