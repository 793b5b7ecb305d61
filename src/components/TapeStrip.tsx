import { clsx } from 'clsx';
import type { CSSProperties } from 'react';
import type { ChapterKind } from '../../shared/domain/words';

/** `laid` is real, `suggested` waits for somebody to take it, `empty` is where tape will lie. */
export type TapeLaid = 'laid' | 'suggested' | 'empty';

type Props = {
  /** colour and weave; `plain` for what has no kind, such as an upload */
  kind: ChapterKind | 'plain';
  laid?: TapeLaid;
  size?: 'thin' | 'regular' | 'tall';
  /** read out in place of the picture; without it the strip is decoration beside its words */
  label?: string;
  className?: string;
  style?: CSSProperties;
};

/** A strip of tape: a chapter, a block's head, a result, a round done, time used. Its width comes from its place. */
export function TapeStrip({ kind, laid = 'laid', size = 'regular', label, className, style }: Props) {
  return (
    <span
      className={clsx('tape', className)}
      data-tape={kind}
      data-laid={laid}
      data-size={size}
      style={style}
      {...(label ? { role: 'img', 'aria-label': label } : { 'aria-hidden': true })}
    />
  );
}
