import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Option } from '../../components/OptionList';
import { SearchBox } from '../../components/SearchBox';
import { momentPath } from '../../lib/momentPath';
import { suggestQuery } from './api';
import { useSettled } from './useSettled';

type Props = {
  team: string;
  /** what stands in the box at first */
  initial?: string;
  place: 'page' | 'bar';
  autoFocus?: boolean;
  onFind: (q: string) => void;
};

/** The one box: a movement, a typo of it, words that were said. A suggestion with a demo plays it at once. */
export function FindBox({ team, initial = '', place, autoFocus = false, onFind }: Props) {
  const [text, setText] = useState(initial);
  const navigate = useNavigate();
  const { data } = useQuery(suggestQuery(team, useSettled(text)));
  const items = text.trim().length > 1 ? (data?.items ?? []) : [];
  const suggestions: Option[] = items.map(({ movement, matched, demo }) => ({
    value: movement.id,
    label: movement.name,
    note: [
      matched.toLowerCase() === movement.name.toLowerCase() ? null : `also “${matched}”`,
      demo ? 'plays the demo' : 'not filmed yet',
    ]
      .filter(Boolean)
      .join(' · '),
    ...(demo ? { tape: demo.kind } : {}),
  }));
  const take = (option: Option) => {
    const taken = items.find(({ movement }) => movement.id === option.value);
    setText(option.label);
    if (taken?.demo) navigate(momentPath(team, taken.demo));
    else onFind(option.label);
  };
  return (
    <SearchBox
      label="Find a movement or a word"
      value={text}
      onChange={setText}
      onSubmit={(q) => q && onFind(q)}
      suggestions={suggestions}
      onTake={take}
      place={place}
      autoFocus={autoFocus}
    />
  );
}
