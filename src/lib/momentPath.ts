import { teamPath } from './session';

/** The address that plays a moment: its recording from its second on. */
export const momentPath = (
  team: string,
  moment: { recordingId: string; startMs: number },
  atMs = moment.startMs,
): string => `${teamPath(team, 'watch', moment.recordingId)}?t=${atMs / 1000}`;
