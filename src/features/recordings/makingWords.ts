import type { Recording, Step } from '../../../shared/contracts/recordings';
import type { MakingStep } from '../../../shared/domain/words';
import { formatList } from '../../lib/format';

/** What the worker does, in the words of those who wait for it. */
const doing = {
  drawing: 'Drawing and speaking the recording',
  probe: 'Reading the file',
  poster: 'Taking a still',
  playback: 'Making the web version',
  chapterPictures: 'Taking pictures of the chapters',
} as const satisfies Record<MakingStep, string>;

const missing = {
  drawing: 'the drawn recording',
  probe: 'what the file holds',
  poster: 'the still',
  playback: 'the web version',
  chapterPictures: 'the pictures of its chapters',
} as const satisfies Record<MakingStep, string>;

/** What takes longest is what one waits for. */
const byWeight: readonly MakingStep[] = ['playback', 'drawing', 'probe', 'chapterPictures', 'poster'];

export type Making = { label: string; share: number | null; note: string | null };

/** What is being made of a recording right now; null when nothing is. */
export function makingOf({ steps, state }: Pick<Recording, 'steps' | 'state'>): Making | null {
  const running = inOrder(steps.filter((step) => step.state === 'running'));
  const waiting = inOrder(steps.filter((step) => step.state === 'waiting'));
  const [main, ...others] = running;
  if (main)
    return {
      label: doing[main.step],
      share: main.percent > 0 ? main.percent / 100 : null,
      note: others.length > 0 ? `also ${formatList(others.map(({ step }) => lowered(doing[step])))}` : null,
    };
  if (waiting[0] && state !== 'failed')
    return {
      label: state === 'making' ? 'Waits for its turn' : `${doing[waiting[0].step]}: waits for its turn`,
      share: null,
      note: null,
    };
  return state === 'making' ? { label: 'Waits for its turn', share: null, note: null } : null;
}

/** For a recording that plays: what could not be made beside it, as a sentence; null when all of it was. */
export function notMadeOf({ steps, state }: Pick<Recording, 'steps' | 'state'>): string | null {
  const failed = steps.filter((step) => step.state === 'failed');
  if (state !== 'ready' || failed.length === 0) return null;
  return `It plays, but ${formatList(failed.map(({ step }) => missing[step]))} could not be made.`;
}

const inOrder = (steps: readonly Step[]) =>
  steps.toSorted((a, b) => byWeight.indexOf(a.step) - byWeight.indexOf(b.step));

const lowered = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);
