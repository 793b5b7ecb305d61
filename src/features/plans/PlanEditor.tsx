import { blockKinds } from '../../../shared/domain/words';
import { limits } from '../../../shared/limits';
import { EmptyState } from '../../components/EmptyState';
import { Icon } from '../../components/Icon';
import { Menu } from '../../components/Menu';
import { TapeStrip } from '../../components/TapeStrip';
import { BlockEditor } from './BlockEditor';
import { blockWords } from './blockWords';
import { PlanHead } from './PlanHead';
import type { PlanLibrary } from './planLibrary';
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
          <span data-part="add">
            <Menu
              look="plain"
              align="start"
              label={
                <>
                  <Icon name="add" size={16} />
                  Add a block
                </>
              }
              items={blockKinds.map((kind) => ({
                label: (
                  <span className="flex items-center gap-3">
                    <TapeStrip kind={kind} className="w-12" />
                    {blockWords[kind]}
                  </span>
                ),
                onSelect: () => edits.addBlock(kind),
              }))}
            />
          </span>
        ) : (
          <p className="text-sm text-ink2">A session has at most {limits.blocksPerSession} blocks.</p>
        )}
      </div>
    </div>
  );
}
