import { IconButton } from '../../components/IconButton';
import type { NotTaken } from './uploader';

/** Files that were chosen and not taken, each with its reason. */
export function NotTakenList({ files, onClose }: { files: readonly NotTaken[]; onClose: () => void }) {
  if (files.length === 0) return null;
  return (
    <div
      role="alert"
      className="mt-4 flex max-w-prose items-start gap-2 border-l-4 border-danger bg-surface py-2 ps-4 pe-2"
    >
      <ul className="min-w-0 grow space-y-2 py-1">
        {files.map(({ fileName, reason }, at) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: the list is replaced as a whole
          <li key={at}>
            <b className="wrap-anywhere">{fileName}</b>
            <br />
            {reason}
          </li>
        ))}
      </ul>
      <IconButton icon="close" label="Close" look="quiet" size="small" onClick={onClose} />
    </div>
  );
}
