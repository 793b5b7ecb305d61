import { type Playhead, useAtPlayhead } from '../../lib/playhead';
import type { Lines } from './api';
import { lineAt } from './lineFaults';

/** The line being spoken, over the picture as members see it, with changes that are not saved yet. */
export function SaidLine({ lines, playhead }: { lines: Lines; playhead: Playhead }) {
  const said = useAtPlayhead(playhead, (ms) => lineAt(lines, ms));
  const text = lines[said]?.text;
  if (!text) return null;
  return (
    <p aria-hidden="true" className="pointer-events-none absolute inset-x-2 bottom-[6%] text-center">
      <span className="bg-shade box-decoration-clone px-2 py-0.5 font-bold whitespace-pre-line text-onShade">
        {text}
      </span>
    </p>
  );
}
