import { Button } from './Button';

type Props = {
  /** what did not work, from the reader's side: “The sessions did not arrive.” */
  title: string;
  /** the sentence that came with the error */
  message?: string;
  /** to tell the owner; it finds the line in the log */
  requestId?: string | undefined;
  onRetry?: () => void;
  busy?: string | undefined;
};

/** In place of what should have been there. */
export function ErrorPanel({ title, message, requestId, onRetry, busy }: Props) {
  return (
    <div role="alert" className="max-w-prose border-l-4 border-danger bg-surface px-4 py-3">
      <p className="font-extrabold">{title}</p>
      {message && <p className="mt-0.5">{message}</p>}
      {requestId && (
        <p className="mt-1 text-xs text-ink2">
          If it stays like this, tell the owner this number:{' '}
          <span className="font-bold wrap-anywhere select-all">{requestId}</span>
        </p>
      )}
      {onRetry && (
        <Button className="mt-3" size="small" busy={busy} onClick={onRetry}>
          Try again
        </Button>
      )}
    </div>
  );
}
