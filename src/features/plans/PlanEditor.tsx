import { blockKinds } from '../../../shared/domain/words';
import { limits } from '../../../shared/limits';
import { Button } from '../../components/Button';
import { EmptyState } from '../../components/EmptyState';
import { TapeStrip } from '../../components/TapeStrip';
import { BlockEditor } from './BlockEditor';
import { blockWords } from './blockWords';
import { PlanHead } from './PlanHead';
import type { PlanLibrary } from './planLibrary';
import { Toolbar } from './Toolbar';
import type { PlanEdits } from './usePlanEdits';
import type { WrittenPlan } from './writtenPlan';

/** A session's plan, to be written. */
export function PlanEditor({ plan, edits, library }: { plan: WrittenPlan; edits: PlanEdits; library: PlanLibrary }) {
  const { blocks } = plan;
  return (
    <div className="grid gap-7">
      <PlanHead plan={plan} edits={edits} />
      <h2 className="sr-only">Blocks</h2>
      {blocks.length === 0 && (
        <EmptyState title="No block yet.">
          A session is made of blocks: a warm-up, a workout, a cool-down. Add the first one below.
        </EmptyState>
      )}
      {blocks.map((block, at) => (
        <BlockEditor key={block.id} block={block} place={at + 1} of={blocks.length} edits={edits} library={library} />
      ))}
      <div data-of="plan">
        {blocks.length < limits.blocksPerSession ? (
          <>
            <h3 className="mb-1.5 text-sm font-bold">Add a block</h3>
            <Toolbar label="Add a block" className="flex flex-wrap gap-2">
              {blockKinds.map((kind) => (
                <Button key={kind} size="small" data-part="add" onClick={() => edits.addBlock(kind)}>
                  <TapeStrip kind={kind} className="w-8" />
                  {blockWords[kind]}
                </Button>
              ))}
            </Toolbar>
          </>
        ) : (
          <p className="text-sm text-ink2">A session has at most {limits.blocksPerSession} blocks.</p>
        )}
      </div>
    </div>
  );
}
