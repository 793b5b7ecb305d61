import type { LeaveQuestion } from '../lib/useLeaveGuard';
import { ConfirmDialog } from './ConfirmDialog';

/** Asked when leaving with changes that cannot be saved right now. */
export function LeaveDialog({ question }: { question: LeaveQuestion | null }) {
  return (
    <ConfirmDialog
      open={question !== null}
      title="Leave with changes that are not saved?"
      confirm="Leave"
      cancel="Stay here"
      onConfirm={() => question?.leave()}
      onClose={() => question?.stay()}
    >
      They could not be saved just now. This browser keeps them, and offers them when you open this page again.
    </ConfirmDialog>
  );
}
