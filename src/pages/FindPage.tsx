import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useSearchParams } from 'react-router-dom';
import { type ChapterKind, chapterKinds } from '../../shared/domain/words';
import { ToggleChip } from '../components/Chip';
import { EmptyState } from '../components/EmptyState';
import { ErrorPanel } from '../components/ErrorPanel';
import { PageTitle } from '../components/PageTitle';
import { SkeletonRows } from '../components/Skeleton';
import { TextButton, TextLink } from '../components/TextLink';
import { VisuallyHidden } from '../components/VisuallyHidden';
import { findQuery } from '../features/search/api';
import { FindBox } from '../features/search/FindBox';
import { Findings } from '../features/search/Findings';
import { understoodWords } from '../features/search/understood';
import { announce } from '../lib/announce';
import { ApiError } from '../lib/api';
import { formatCount } from '../lib/format';
import { teamPath, useTeam } from '../lib/session';

const kindChips: { kind: ChapterKind; label: string }[] = [
  { kind: 'demo', label: 'Demo' },
  { kind: 'substitution', label: 'Substitution' },
  { kind: 'workout', label: 'Workout' },
];

/** One box; the address holds what was asked, so that going back shows it again. */
export function FindPage() {
  const { slug, role } = useTeam();
  const [search, setSearch] = useSearchParams();
  const q = search.get('q')?.trim() ?? '';
  // members see what fits their kit until they say otherwise
  const kit = search.get('kit') === 'any' || (search.get('kit') === null && role !== 'member') ? 'any' : 'mine';
  const kind = chapterKinds.find((one) => one === search.get('kind'));
  const found = useQuery(findQuery(slug, { q, kit, kind }));
  const change = (changes: Record<string, string | null>, history: 'push' | 'replace') => {
    const next = new URLSearchParams(search);
    for (const [name, value] of Object.entries(changes)) value === null ? next.delete(name) : next.set(name, value);
    setSearch(next, { replace: history === 'replace' });
  };

  const count = found.data?.groups.reduce((sum, group) => sum + group.findings.length, 0);
  const settled = found.isSuccess && !found.isPlaceholderData;
  useEffect(() => {
    if (settled && count !== undefined) announce(formatCount(count, 'moment', 'moments'));
  }, [settled, count]);

  return (
    <div className="pt-3 pb-8">
      <VisuallyHidden>
        <PageTitle title={q ? `Find “${q}”` : 'Find'} />
      </VisuallyHidden>
      <FindBox
        key={q}
        team={slug}
        initial={q}
        place="page"
        autoFocus={q === ''}
        onFind={(text) => change({ q: text, kind: null }, 'push')}
      />
      {q === '' ? (
        <EmptyState title="What do you want to see?">
          Type a movement as your coach calls it, a word that was said, or what you do without: “row without rings”.
        </EmptyState>
      ) : (
        <>
          {found.data && <Understood data={found.data} />}
          <fieldset className="mt-3 flex flex-wrap gap-2">
            <legend className="sr-only">Show only</legend>
            <ToggleChip
              pressed={kit === 'mine'}
              onClick={() => change({ kit: kit === 'mine' ? 'any' : 'mine' }, 'replace')}
            >
              My kit
            </ToggleChip>
            {kindChips.map((chip) => (
              <ToggleChip
                key={chip.kind}
                pressed={kind === chip.kind}
                onClick={() => change({ kind: kind === chip.kind ? null : chip.kind }, 'replace')}
              >
                {chip.label}
              </ToggleChip>
            ))}
          </fieldset>
          {found.isPending && <SkeletonRows label="Moments" still="large" />}
          {found.isError && (
            <div className="mt-4">
              <ErrorPanel
                title="The search did not answer."
                message={found.error.message}
                requestId={found.error instanceof ApiError ? (found.error.requestId ?? undefined) : undefined}
                busy={found.isFetching ? 'Trying' : undefined}
                onRetry={() => found.refetch()}
              />
            </div>
          )}
          {found.data && (
            <div className={found.isPlaceholderData ? 'opacity-60' : undefined}>
              <Findings team={slug} groups={found.data.groups} />
              {count === 0 && (
                <NothingFound q={q} narrowed={kind !== undefined} onWiden={() => change({ kind: null }, 'replace')} />
              )}
              {found.data.notFilmed.length > 0 && (
                <p className="mt-5 text-sm text-ink2">
                  Not filmed yet:{' '}
                  {found.data.notFilmed.map((movement, at) => (
                    <span key={movement.id}>
                      {at > 0 && ', '}
                      <TextLink to={teamPath(slug, 'dictionary', movement.id)}>{movement.name}</TextLink>
                    </span>
                  ))}
                </p>
              )}
              {kit === 'mine' && found.data.hiddenByKit > 0 && (
                <p className="mt-4 text-sm text-ink2">
                  {found.data.hiddenByKit} more {found.data.hiddenByKit === 1 ? 'needs' : 'need'} other kit ·{' '}
                  <TextButton onClick={() => change({ kit: 'any' }, 'replace')}>
                    show {found.data.hiddenByKit === 1 ? 'it' : 'them'}
                  </TextButton>
                </p>
              )}
              {found.data.didYouMean.length > 0 && (
                <p className="mt-5">
                  Did you mean{' '}
                  {found.data.didYouMean.map((movement, at) => (
                    <span key={movement.id}>
                      {at > 0 && (at === found.data.didYouMean.length - 1 ? ' or ' : ', ')}
                      <TextButton onClick={() => change({ q: movement.name, kind: null }, 'push')}>
                        {movement.name}
                      </TextButton>
                    </span>
                  ))}
                  ?
                </p>
              )}
            </div>
          )}
        </>
      )}
    </div>
  );
}

function Understood({ data }: { data: { understood: Parameters<typeof understoodWords>[0] } }) {
  const { movements, without } = understoodWords(data.understood);
  if (!movements && !without) return null;
  return (
    <p className="mt-2.5 text-sm text-ink2">
      Showing <strong className="text-ink">{movements ?? 'what to do'}</strong>
      {without && (movements ? `, without ${without}` : ` without ${without}`)}.
    </p>
  );
}

function NothingFound({ q, narrowed, onWiden }: { q: string; narrowed: boolean; onWiden: () => void }) {
  return (
    <EmptyState
      title={`Nothing for “${q}”.`}
      action={narrowed ? <TextButton onClick={onWiden}>Look in every kind of chapter</TextButton> : undefined}
    >
      Try fewer words, the movement’s other name, or a word that the coach said.
    </EmptyState>
  );
}
