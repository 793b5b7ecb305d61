import { type ReactNode, useEffect, useMemo, useRef } from 'react';
import { flushSync } from 'react-dom';
import type { Session } from '../../../shared/contracts/sessions';
import { PageTitle } from '../../components/PageTitle';
import { SaveState } from '../../components/SaveState';
import { UndoButtons } from '../../components/UndoButtons';
import { announce } from '../../lib/announce';
import { useKeys } from '../../lib/keys';
import { useDocument, useSnapshot } from '../../lib/useDocument';
import { useLeaveGuard } from '../../lib/useLeaveGuard';
import { asDocument, useMovementFacts, usePlanSource } from './api';
import { PlanDialogs, useCompare } from './PlanDialogs';
import { PlanEditor } from './PlanEditor';
import { PublishPanel } from './PublishPanel';
import { movementName, type PlanLibrary } from './planLibrary';
import { usePlanEdits } from './usePlanEdits';
import type { WrittenPlan } from './writtenPlan';

type Props = {
  session: Session;
  person: string;
  timeZone: string;
  library: Omit<PlanLibrary, 'facts'>;
  meta: (plan: WrittenPlan) => ReactNode;
  actions: ReactNode;
  /** below the publishing panel */
  aside: ReactNode;
  onRemoved: () => void;
};

/** The plan's own desk: written on the left, published on the right, saved by itself. Keyed by the session. */
export function PlanDesk({ session, person, timeZone, library, meta, actions, aside, onRemoved }: Props) {
  const { team } = library;
  const names = useRef(library.names);
  useEffect(() => {
    names.current = library.names;
  });
  const source = usePlanSource({ team, sessionId: session.id, person }, (id) => movementName(names.current, id));
  const saved = useMemo(() => asDocument(session), [session]);
  const kept = useDocument(saved, source, () => announce('The plan is shown as it is saved now'));
  const { content, save, canUndo, canRedo } = useSnapshot(kept);
  const edits = usePlanEdits(kept);
  const [compare, setCompare] = useCompare(save.is === 'stale');
  const question = useLeaveGuard([kept]);
  useKeys({ 'Mod+z': edits.undo, 'Mod+Shift+z': edits.redo, 'Mod+y': edits.redo });
  const facts = useMovementFacts(team, useMovementIds(content));
  const writing = useMemo(() => ({ ...library, facts }), [library, facts]);
  return (
    <>
      <PageTitle title={content.title.trim() || 'Session'} meta={meta(content)} actions={actions} />
      <div className="sticky top-0 z-20 -mx-4 mt-1 mb-3 flex min-h-11 flex-wrap items-center gap-x-3 border-b border-line bg-ground px-4 md:-mx-5 md:px-5">
        <UndoButtons canUndo={canUndo} canRedo={canRedo} onUndo={edits.undo} onRedo={edits.redo} />
        <SaveState state={save} onRetry={() => void kept.flush()} onCompare={() => setCompare('open')} />
      </div>
      <div className="grid items-start gap-x-7 gap-y-10 xl:grid-cols-[minmax(0,1fr)_22rem] 2xl:grid-cols-[minmax(0,1fr)_26rem]">
        <PlanEditor plan={content} edits={edits} library={writing} />
        <div id="publish" className="grid scroll-mt-14 gap-8">
          <PublishPanel
            team={team}
            timeZone={timeZone}
            session={session}
            isSaved={save.is === 'saved'}
            saveFirst={async () => ((await kept.flush()) ? kept.current().base.version : null)}
            onRemoved={() => {
              // nothing is left to be saved
              flushSync(() => kept.adopt(kept.current().base));
              onRemoved();
            }}
          />
          {aside}
        </div>
      </div>
      <PlanDialogs
        kept={kept}
        names={library.names}
        question={question}
        compare={compare}
        onClose={() => setCompare('closed')}
      />
    </>
  );
}

/** The movements that a plan names; the same list as long as they stay the same. */
export function useMovementIds(plan: {
  blocks: readonly { lines: readonly { movementId: string | null }[] }[];
}): string[] {
  const key = [
    ...new Set(plan.blocks.flatMap(({ lines }) => lines.flatMap(({ movementId }) => movementId ?? []))),
  ].join();
  return useMemo(() => (key === '' ? [] : key.split(',')), [key]);
}
