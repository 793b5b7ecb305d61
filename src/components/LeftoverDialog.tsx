import type { Draft } from '../lib/drafts';
import { formatAgo } from '../lib/format';
import { Button } from './Button';
import { Dialog } from './Dialog';
import { GoButton } from './GoButton';

type Props = {
  left: Draft<unknown> | null;
  /** “chapters” */
  of: string;
  onChoose: (choice: 'take' | 'drop') => void;
};

/** Offered on coming back: changes that an earlier visit did not get saved. Closing takes them up, which undo takes back. */
export function LeftoverDialog({ left, of, onChoose }: Props) {
  return (
    <Dialog
      open={left !== null}
      onClose={() => onChoose('take')}
      title={`Your changes to the ${of} are still here`}
      actions={
        <>
          <Button onClick={() => onChoose('drop')}>Drop them</Button>
          <GoButton data-first-focus onClick={() => onChoose('take')}>
            Take them up
          </GoButton>
        </>
      }
    >
      {left && (
        <p>
          They were made {formatAgo(left.at)} in this browser and never reached Tapeline. If somebody saved meanwhile,
          you see both versions before anything is overwritten.
        </p>
      )}
    </Dialog>
  );
}
