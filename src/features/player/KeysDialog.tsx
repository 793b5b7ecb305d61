import { Dialog } from '../../components/Dialog';
import { Key } from '../../components/Key';

const keys = [
  { names: ['Space'], does: 'Play or pause' },
  { names: ['ArrowLeft', 'ArrowRight'], does: '5 seconds back or on' },
  { names: ['Home', 'End'], does: 'To the beginning or the end, with the player in focus' },
  { names: ['ArrowUp', 'ArrowDown'], does: 'Louder or quieter, with the picture in focus' },
  { names: ['PageUp', 'PageDown'], does: '30 seconds on or back, on the bar' },
  { names: ['Escape'], does: 'Leave full screen' },
] as const;

/** The keys of the player: those that every browser's own video controls have. */
export function KeysDialog({ open, onClose }: { open: boolean; onClose: () => void }) {
  return (
    <Dialog open={open} onClose={onClose} title="Keys">
      <table className="w-full">
        <thead className="sr-only">
          <tr>
            <th scope="col">Key</th>
            <th scope="col">What it does</th>
          </tr>
        </thead>
        <tbody>
          {keys.map(({ names, does }) => (
            <tr key={does} className="border-b border-line last:border-0">
              <td className="py-2.5 pe-4 whitespace-nowrap">
                <span className="inline-flex gap-1.5">
                  {names.map((name) => (
                    <Key key={name} name={name} />
                  ))}
                </span>
              </td>
              <td className="py-2.5">{does}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="mt-3 text-sm text-ink2">On a touch screen, tap twice at the left or right edge for 5 seconds.</p>
    </Dialog>
  );
}
