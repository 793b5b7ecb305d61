import { useEffect, useRef, useState } from 'react';
import { type Pattern, patterns } from '../../../shared/domain/words';
import type { Address } from './useAddress';

/** A pause in the typing after which it is looked for. */
const settledAfterMs = 180;

export type DictionaryAddress = {
  /** what is looked for */
  q: string;
  pattern: Pattern | undefined;
  /** what stands in the box */
  text: string;
  type: (text: string) => void;
  /** looks at once */
  submit: (text: string) => void;
  choosePattern: (pattern: Pattern | undefined) => void;
};

/** What the list shows is in the address, so that a reload, a link and the way back show the same. */
export function useDictionaryAddress({ search, change }: Address): DictionaryAddress {
  const q = search.get('q')?.trim() ?? '';
  const pattern = patterns.find((one) => one === search.get('pattern'));
  const [text, setText] = useState(q);
  const sent = useRef(q);
  const submit = (typed: string) => {
    sent.current = typed.trim();
    if (sent.current !== q) change('q', sent.current || undefined);
  };

  // the address changed elsewhere: by the way back, or by the navigation
  useEffect(() => {
    if (q === sent.current) return;
    sent.current = q;
    setText(q);
  }, [q]);
  const latest = useRef(submit);
  useEffect(() => {
    latest.current = submit;
  });
  useEffect(() => {
    const timer = setTimeout(() => latest.current(text), settledAfterMs);
    return () => clearTimeout(timer);
  }, [text]);

  return { q, pattern, text, type: setText, submit, choosePattern: (next) => change('pattern', next) };
}
