import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { ChapterKind } from '../../shared/domain/words';
import { Still } from './Still';
import { TapeStrip } from './TapeStrip';

type Props = {
  title: ReactNode;
  /** the whole row leads there */
  to?: string;
  still?: { src?: string | null; length?: string } | null;
  size?: 'small' | 'large';
  /** plain lines below the name: what it stands in for, who shows it, what it needs */
  notes?: readonly ReactNode[];
  /** the dose or another figure, at the end */
  figure?: ReactNode;
  tape?: ChapterKind;
  /** beside the figure: a button of its own, outside of the link */
  action?: ReactNode;
};

/** A row of a list: a picture, a name in heavy weight, the dose in figures at the end. Put rows in a `ul`. */
export function MediaRow({ title, to, still, size = 'small', notes = [], figure, tape, action }: Props) {
  return (
    <li className="relative flex items-start gap-3 py-2.5">
      {still !== null && (
        <Still {...still} className={size === 'small' ? 'w-[min(5.75rem,28%)]' : 'w-[min(9.25rem,42%)]'} />
      )}
      <div className="min-w-0 grow">
        <div className="flex items-start justify-between gap-3 text-md font-extrabold">
          <div className="min-w-0 wrap-anywhere">
            {to ? (
              <Link to={to} className="no-underline after:absolute after:inset-0 hover:underline">
                {title}
              </Link>
            ) : (
              title
            )}
          </div>
          {figure && <div className="max-w-1/2 flex-none text-end">{figure}</div>}
        </div>
        {notes.filter(Boolean).map((note, at) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: lines of one row, never reordered
          <div key={at} className="text-sm text-ink2 wrap-anywhere">
            {note}
          </div>
        ))}
        {tape && <TapeStrip kind={tape} className="mt-2 w-18" />}
      </div>
      {action && <div className="relative z-10 flex-none">{action}</div>}
    </li>
  );
}
