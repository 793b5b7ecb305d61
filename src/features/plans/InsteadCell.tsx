import { needTexts, waysOf } from './lineWays';
import { movementName, type PlanLibrary } from './planLibrary';
import type { WrittenLine } from './writtenPlan';

/** What to do instead of a line when something is missing, one way a row; what nobody thought of yet stands out. */
export function InsteadCell({ line, library }: { line: WrittenLine; library: PlanLibrary }) {
  const facts = line.movementId === null ? undefined : library.facts.get(line.movementId);
  const ways = waysOf(line, facts, library.kit);
  const needs = facts ? needTexts(facts, library.kit) : [];
  if (ways.length === 0 && needs.length === 0) return facts ? <span className="text-ink2">needs no kit</span> : null;
  if (ways.length === 0) return <b className="text-danger">{needs.join(', ')}: nothing yet</b>;
  return (
    <ul>
      {ways.map((way, at) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: two ways may lead to one movement
        <li key={at} className={way.from === 'plan' ? undefined : 'text-ink2'}>
          {way.lack}: {movementName(library.names, way.movementId)}
          {way.dose && `, ${way.dose}`}
          {way.from === 'dictionary' && <span className="sr-only"> (from the dictionary)</span>}
        </li>
      ))}
    </ul>
  );
}
