import { useEffect, useRef, useState } from 'react';
import { Icon } from '../../components/Icon';

/** Files can be dropped anywhere on the page; while some are held over it, it says so. */
export function DropZone({ onFiles }: { onFiles: (files: File[]) => void }) {
  const [held, setHeld] = useState<'over' | 'away'>('away');
  const latest = useRef(onFiles);
  useEffect(() => {
    latest.current = onFiles;
  });
  useEffect(() => {
    const over = (event: DragEvent) => {
      if (!carriesFiles(event)) return;
      // without it the browser would open the file in place of the page
      event.preventDefault();
      setHeld('over');
    };
    const leave = (event: DragEvent) => {
      if (event.relatedTarget === null) setHeld('away');
    };
    const drop = (event: DragEvent) => {
      if (!carriesFiles(event)) return;
      event.preventDefault();
      setHeld('away');
      const files = [...(event.dataTransfer?.files ?? [])];
      if (files.length > 0) latest.current(files);
    };
    const page = new AbortController();
    const { signal } = page;
    window.addEventListener('dragenter', over, { signal });
    window.addEventListener('dragover', over, { signal });
    window.addEventListener('dragleave', leave, { signal });
    window.addEventListener('drop', drop, { signal });
    return () => page.abort();
  }, []);

  if (held === 'away') return null;
  return (
    <div className="pointer-events-none fixed inset-0 z-50 flex items-center justify-center bg-ground/95 p-4">
      <div className="flex size-full flex-col items-center justify-center gap-3 rounded border-4 border-dashed border-ink text-center">
        <Icon name="upload" size={44} />
        <p className="text-lg font-extrabold">Let go to upload</p>
      </div>
    </div>
  );
}

const carriesFiles = (event: DragEvent) => event.dataTransfer?.types.includes('Files') ?? false;
