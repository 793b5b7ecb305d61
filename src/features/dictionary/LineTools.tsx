import { IconButton } from '../../components/IconButton';
import { TextButton } from '../../components/TextLink';
import type { ListTools } from './useListTools';

/** Up, down and out, for one line of a list. @param what “point 2” */
export function LineTools({ tools, at, what }: { tools: ListTools; at: number; what: string }) {
  return (
    <span className="flex flex-none">
      <IconButton
        icon="chevron"
        label={`Move ${what} up`}
        look="quiet"
        size="small"
        className="[&_svg]:rotate-180"
        data-does="up"
        disabled={at === 0}
        onClick={() => tools.move(at, -1)}
      />
      <IconButton
        icon="chevron"
        label={`Move ${what} down`}
        look="quiet"
        size="small"
        data-does="down"
        disabled={at === tools.count - 1}
        onClick={() => tools.move(at, 1)}
      />
      <IconButton
        icon="close"
        label={`Take ${what} out`}
        look="quiet"
        size="small"
        data-does="remove"
        onClick={() => tools.remove(at)}
      />
    </span>
  );
}

/** Below a list: what was taken out of it last. */
export function TakenOut({ taken }: { taken: ListTools['taken'] }) {
  return (
    <p role="status" className="text-sm text-ink2 empty:hidden">
      {taken && (
        <>
          “{taken.text}” was taken out. <TextButton onClick={taken.putBack}>Put it back</TextButton>
        </>
      )}
    </p>
  );
}
