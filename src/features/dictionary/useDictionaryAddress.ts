import { useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { type Pattern, patterns } from '../../../shared/domain/words';

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
export function useDictionaryAddress(): DictionaryAddress {
  const [search, setSearch] = useSearchParams();
  const q = search.get('q')?.trim() ?? '';
  const pattern = patterns.find((one) => one === search.get('pattern'));
  const [text, setText] = useState(q);
  const sent = useRef(q);

  const change = (name: 'q' | 'pattern', value: string | undefined) =>
    setSearch(
      (before) => {
        const next = new URLSearchParams(before);
        value ? next.set(name, value) : next.delete(name);
        return next;
      },
      { replace: true },
    );
  const submit = (typed: string) => {
    sent.current = typed.trim();
    if (sent.current !== q) change('q', sent.current);
  };

  // the address changed elsewhere: by the way back, or by the navigation
  useEffect(() => {
    if (q === sent.current) return;
    sent.current = q;
    setText(q);
  }, [q]);
  // biome-ignore lint/correctness/useExhaustiveDependencies: only typing starts the clock
  useEffect(() => {
    if (text.trim() === q) return;
    const timer = setTimeout(() => submit(text), settledAfterMs);
    return () => clearTimeout(timer);
  }, [text]);

  return { q, pattern, text, type: setText, submit, choosePattern: (next) => change('pattern', next) };
}
