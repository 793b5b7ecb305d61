import { useEffect, useRef } from 'react';
import { announce } from '../lib/announce';
import type { SaveState as State } from '../lib/keptDocument';
import { TextButton } from './TextLink';

type Props = {
  state: State<unknown>;
  /** what it is about, where a page keeps two documents: “Cues” */
  of?: string;
  onRetry: () => void;
  /** opens the comparison of the two versions */
  onCompare: () => void;
};

/** Whether what was written is kept: said beside the title, read out when it goes wrong and when it is mended. */
export function SaveState({ state, of, onRetry, onCompare }: Props) {
  const lead = of ? `${of}: ` : '';
  const trouble = 'reason' in state ? `${lead}Not saved. ${state.reason}` : null;
  const before = useRef<string | null>(null);
  useEffect(() => {
    if (trouble && trouble !== before.current) announce(trouble);
    if (state.is === 'saved' && before.current) announce(`${lead}Saved`);
    if (state.is === 'saved' || trouble) before.current = trouble;
  }, [trouble, state.is, lead]);

  const words = (text: string) => (of ? `${of}: ${text.toLowerCase()}` : text);
  if (state.is === 'saved') return <span className="text-sm font-extrabold text-good">{words('Saved')}</span>;
  if (state.is === 'waiting' || state.is === 'saving')
    return (
      <span className="text-sm font-extrabold text-ink2">
        {words(state.is === 'saving' ? 'Saving' : 'Not saved yet')}
      </span>
    );
  if (state.is === 'stale')
    return (
      <span className="text-sm font-bold text-danger">
        {words('Not saved')}: somebody else was faster. <TextButton onClick={onCompare}>Compare the two</TextButton>
      </span>
    );
  return (
    <span className="text-sm font-bold text-danger">
      {words('Not saved')}: {state.reason}{' '}
      {state.is === 'failed' && <TextButton onClick={onRetry}>Try again</TextButton>}
    </span>
  );
}
