import { IconButton } from './IconButton';

type Props = {
  canUndo: boolean;
  canRedo: boolean;
  onUndo: () => void;
  onRedo: () => void;
  /** `shown` where the keys work on this document */
  keys?: 'shown' | 'hidden';
};

export function UndoButtons({ canUndo, canRedo, onUndo, onRedo, keys = 'shown' }: Props) {
  return (
    <span className="inline-flex gap-1">
      <IconButton
        icon="undo"
        label={keys === 'shown' ? 'Undo (Ctrl or Command with Z)' : 'Undo'}
        look="quiet"
        size="small"
        disabled={!canUndo}
        onClick={onUndo}
      />
      <IconButton
        icon="redo"
        label={keys === 'shown' ? 'Redo (Ctrl or Command with Shift and Z)' : 'Redo'}
        look="quiet"
        size="small"
        disabled={!canRedo}
        onClick={onRedo}
      />
    </span>
  );
}
