import type { z } from 'zod';
import type { WatchedMovement } from '../../../shared/contracts/watch';
import { Caution } from '../../components/Caution';
import { Section } from '../../components/PageTitle';
import { TextLink } from '../../components/TextLink';
import { teamPath } from '../../lib/session';

type Movement = z.infer<typeof WatchedMovement>;

/** Cautions of the movement that plays. */
export function MovementCautions({ movement }: { movement: Movement }) {
  return movement.cautions.map(({ say, more }) => (
    <Caution key={say} todo={say}>
      {more}
    </Caution>
  ));
}

/** What to look for in the movement that plays, and what often goes wrong. */
export function MovementNotes({ team, movement }: { team: string; movement: Movement }) {
  const { id, name, points, faults } = movement;
  return (
    <div className="grid gap-x-10 gap-y-5 sm:grid-cols-2">
      {points.length > 0 && (
        <Section title="Points of performance" place="aside">
          <Lines lines={points} />
        </Section>
      )}
      {faults.length > 0 && (
        <Section title="Common faults" place="aside">
          <Lines lines={faults} />
        </Section>
      )}
      <p className="sm:col-span-2">
        <TextLink to={teamPath(team, 'dictionary', id)} className="inline-flex min-h-12 items-center">
          All about {name}
        </TextLink>
      </p>
    </div>
  );
}

function Lines({ lines }: { lines: readonly string[] }) {
  return (
    <ul className="list-[square] space-y-1 ps-5 marker:text-ink2">
      {lines.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </ul>
  );
}
