import type { Session } from '../../../shared/contracts/sessions';
import { EmptyState } from '../../components/EmptyState';
import { Table } from '../../components/Table';
import { TapeStrip } from '../../components/TapeStrip';
import { blockName } from './blockWords';
import { DemoCell } from './DemoCell';
import { InsteadCell } from './InsteadCell';
import { movementName, type PlanLibrary } from './planLibrary';
import { asWritten, type WrittenBlock } from './writtenPlan';

/** A session's plan for those who do not change it. */
export function PlanReading({ session, library }: { session: Session; library: PlanLibrary }) {
  return (
    <div className="grid gap-6">
      {session.aim && <p className="font-bold wrap-anywhere">{session.aim}</p>}
      {session.note && <p className="max-w-prose whitespace-pre-line wrap-anywhere">{session.note}</p>}
      {session.blocks.length === 0 && (
        <EmptyState title="The plan has no blocks yet.">Its coach is still at it.</EmptyState>
      )}
      {asWritten(session).blocks.map((block) => (
        <section key={block.id} aria-label={blockName(block)}>
          <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
            <TapeStrip kind={block.kind} className="w-23" />
            <h2 className="text-md font-extrabold wrap-anywhere">{blockName(block)}</h2>
            {block.scheme && <span className="text-ink2">{block.scheme}</span>}
          </div>
          {block.note && <p className="mt-1 max-w-prose whitespace-pre-line wrap-anywhere">{block.note}</p>}
          {block.lines.length > 0 && <Lines block={block} library={library} />}
        </section>
      ))}
    </div>
  );
}

function Lines({ block, library }: { block: WrittenBlock; library: PlanLibrary }) {
  return (
    <Table
      caption={`Lines of ${blockName(block)}`}
      rows={block.lines}
      rowKey={(line) => line.id}
      columns={[
        {
          key: 'movement',
          head: 'Movement',
          role: 'name',
          cell: (line) => (
            <>
              {movementName(library.names, line.movementId ?? '')}
              {line.note && <span className="block font-normal text-ink2 wrap-anywhere">{line.note}</span>}
            </>
          ),
        },
        { key: 'dose', head: 'Dose', width: 'w-1/5', cell: (line) => line.dose },
        {
          key: 'demo',
          head: 'Demo',
          width: 'w-1/5',
          cell: (line) => <DemoCell team={library.team} facts={library.facts.get(line.movementId ?? '')} />,
        },
        {
          key: 'instead',
          head: 'Instead, when missing',
          width: 'w-1/4',
          cell: (line) => <InsteadCell line={line} library={library} />,
        },
      ]}
    />
  );
}
