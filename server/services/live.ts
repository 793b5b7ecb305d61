import type { LiveEvent } from '../../shared/contracts/live';
import { database } from '../models/database';

export const liveChannel = 'tapeline_live';

/** Tells every web process, and through them the team's open pages; inside a transaction it is heard when that commits. */
export async function tell(teamId: string, event: LiveEvent): Promise<void> {
  await database().query('select pg_notify(:channel, :payload)', {
    replacements: { channel: liveChannel, payload: JSON.stringify({ teamId, event }) },
  });
}
