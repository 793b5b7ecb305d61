import { onlineManager } from '@tanstack/react-query';
import { useSyncExternalStore } from 'react';

/** While the device has no network: what waits goes on by itself, so nobody has to press again. */
export function OfflineNotice() {
  const isOnline = useSyncExternalStore(
    (onChange) => onlineManager.subscribe(onChange),
    () => onlineManager.isOnline(),
  );
  return (
    <div role="status">
      {!isOnline && (
        <p className="border-b-thin border-edge bg-raised px-4.5 py-2 text-sm">
          <strong>No connection.</strong> What waits here goes on by itself when it is back.
        </p>
      )}
    </div>
  );
}
