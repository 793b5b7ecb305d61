import { ButtonLink } from '../../components/Button';
import { EmptyState } from '../../components/EmptyState';
import { PageTitle, Section } from '../../components/PageTitle';
import { TextLink } from '../../components/TextLink';
import { formatCount } from '../../lib/format';
import { teamPath } from '../../lib/session';
import type { MovementPage } from './api';
import { EditMovement } from './EditMovement';
import type { KitById } from './kitWords';
import { MomentRows } from './MomentRows';
import { MovementPicture } from './MovementPicture';
import { StandsInFor } from './StandsInFor';
import { SubstitutionTable } from './SubstitutionTable';
import type { useMovementPage } from './useMovementPage';

type Props = {
  team: string;
  kit: KitById;
  page: MovementPage;
  arrival: ReturnType<typeof useMovementPage>['arrival'];
};

/** All of a movement at the desk: what is written of it, its picture, what stands in for it, and what shows it. */
export function DeskMovement({ team, kit, page, arrival }: Props) {
  const { movement, substitutions, standsInFor, moments } = page;
  const news = arrivalWords(arrival, movement.name);
  return (
    <div className="space-y-4">
      <PageTitle
        title={movement.name}
        meta={<TextLink to={teamPath(team, 'movements')}>All movements</TextLink>}
        actions={
          <>
            <ButtonLink size="small" to={teamPath(team, 'dictionary', movement.id)}>
              As members see it
            </ButtonLink>
            <ButtonLink size="small" to={`${teamPath(team, 'movements')}?merge=${movement.id}`}>
              Merge with another
            </ButtonLink>
          </>
        }
      />
      {news && (
        <p role="status" className="border-l-4 border-good bg-surface px-3 py-2 text-sm">
          {news}
        </p>
      )}
      <div className="grid gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <div className="min-w-0 space-y-9">
          <EditMovement team={team} movement={movement} kit={kit} />
          <SubstitutionTable team={team} movement={movement} substitutions={substitutions} kit={kit} />
          {standsInFor.length > 0 && (
            <Section title="It stands in for">
              <StandsInFor standsInFor={standsInFor} kit={kit} pathOf={(id) => teamPath(team, 'movements', id)} />
            </Section>
          )}
        </div>
        <div className="min-w-0 space-y-8">
          <Section title="Picture" place="aside">
            <MovementPicture team={team} movement={movement} />
          </Section>
          <Section
            title={
              moments.length === 0 ? 'Shown in' : `Shown in ${formatCount(moments.length, 'moment', 'moments', 200)}`
            }
            place="aside"
          >
            {moments.length === 0 ? (
              <EmptyState title="None yet: film it.">
                Once a chapter of a recording is marked with {movement.name}, it is listed here.
              </EmptyState>
            ) : (
              <MomentRows team={team} moments={moments} size="small" />
            )}
          </Section>
        </div>
      </div>
    </div>
  );
}

function arrivalWords({ added, ledOn, gone }: Props['arrival'], name: string): string | null {
  if (gone) return `“${gone}” is another name of ${name} now. What pointed at it points here.`;
  if (ledOn) return `The movement that you asked for was merged into ${name}.`;
  if (added) return `${name} is in the dictionary. Add a picture, and what to do instead of it.`;
  return null;
}
