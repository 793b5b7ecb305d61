import { type ObjectStore, openStore, type StoreConfig } from '../../storage/objectStore';
import { mediaPath } from '../../storage/signing';

/** What a process is connected to beside its database; set once at boot, before the first request or job. */
type Context = { store: ObjectStore; mediaSecret: string; publicUrl: string };

let context: Context | undefined;

export function connectServices(config: { store: StoreConfig; mediaSecret: string; publicUrl: string }): Context {
  context = { store: openStore(config.store), mediaSecret: config.mediaSecret, publicUrl: config.publicUrl };
  return context;
}

function connected(): Context {
  if (!context) throw new Error('The services are not connected.');
  return context;
}

export const store = (): ObjectStore => connected().store;
export const publicUrl = (): string => connected().publicUrl;

/** The signed address of something made from a recording or a movement; ask the policy first. */
export const mediaUrl = (teamId: string, ownerId: string, name: string): string =>
  mediaPath(connected().mediaSecret, teamId, ownerId, name);
