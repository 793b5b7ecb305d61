import type { ReactNode } from 'react';
import { Caution } from '../../components/Caution';
import { PageTitle, Section } from '../../components/PageTitle';
import { TextLink } from '../../components/TextLink';
import { teamPath, useMay } from '../../lib/session';
import type { MovementPage } from './api';
import { BestDemo, bestDemo } from './BestDemo';
import { InsteadRows } from './InsteadRows';
import { type KitById, kitWords } from './kitWords';
import { MomentRows } from './MomentRows';
import { StandsInFor } from './StandsInFor';

type Props = { team: string; kit: KitById; page: MovementPage; arrived: 'directly' | 'from a merged one' };

/** A movement beside the mat: see it, what makes it right, what to mind, what to do instead. */
export function FloorMovement({ team, kit, page, arrived }: Props) {
  const { movement, substitutions, standsInFor, moments } = page;
  const mayEdit = useMay('editMovement');
  const best = bestDemo(moments);
  const others = moments.filter((moment) => moment !== best);
  const needs = kitWords(movement.kitNeeded, kit);
  return (
    <div className="pb-8">
      <BestDemo team={team} movement={movement} moment={best}>
        <PageTitle title={movement.name} meta={movement.pattern} />
        {arrived === 'from a merged one' && (
          <p role="status" className="mt-1 text-sm text-ink2">
            What you asked for goes by this name now.
          </p>
        )}
        {movement.otherNames.length > 0 && (
          <p className="mt-1 text-sm text-ink2">also {movement.otherNames.join(', ')}</p>
        )}
        <p className="mt-1.5">
          {needs ? (
            <>
              Needs <strong>{needs}</strong>.
            </>
          ) : (
            'Needs no kit.'
          )}
        </p>
        {!best && (
          <p className="mt-3 text-ink2">
            <strong className="text-ink">Nobody has filmed this yet.</strong>{' '}
            {substitutions.length > 0
              ? 'Go by the words below, or look at what to do instead.'
              : 'Go by the words below, and ask your coach where you are not sure.'}
          </p>
        )}
      </BestDemo>
      <div className="mt-5 space-y-6">
        {movement.cautions.length > 0 && (
          <div className="space-y-2">
            {movement.cautions.map((caution) => (
              <Caution key={caution.say} todo={caution.say}>
                {caution.more}
              </Caution>
            ))}
          </div>
        )}
        <Lines title="Do it like this" lines={movement.points} />
        <Lines title="What often goes wrong" lines={movement.faults} />
        <Section title="Instead of it">
          {substitutions.length === 0 ? (
            <p className="text-ink2">Nothing is written here yet. Ask your coach what to do when you can’t do it.</p>
          ) : (
            <InsteadRows team={team} substitutions={substitutions} kit={kit} />
          )}
        </Section>
        {standsInFor.length > 0 && (
          <Section title="It stands in for">
            <StandsInFor standsInFor={standsInFor} kit={kit} pathOf={(id) => teamPath(team, 'dictionary', id)} />
          </Section>
        )}
        {others.length > 0 && (
          <Section title="More moments">
            <MomentRows team={team} moments={others} size="large" />
          </Section>
        )}
        {mayEdit && (
          <p className="text-sm">
            <TextLink to={teamPath(team, 'movements', movement.id)}>Change it at the desk</TextLink>
          </p>
        )}
      </div>
    </div>
  );
}

function Lines({ title, lines }: { title: string; lines: readonly string[] }): ReactNode {
  if (lines.length === 0) return null;
  return (
    <Section title={title}>
      <ul>
        {lines.map((line) => (
          <li key={line} className="border-b border-line py-2.5 last:border-b-0">
            {line}
          </li>
        ))}
      </ul>
    </Section>
  );
}
