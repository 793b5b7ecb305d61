/** What makes up all of a run: its pictures, where their number is known, else its length. */
export type Whole = { frames: number } | { durationMs: number };

/**
 * How far a run is by one line of ffmpeg's own report, or undefined where the line tells nothing.
 * Counting pictures is the surer way: outputs of one picture in many seconds push the reported time past the end.
 * @returns whole percent, 0 to 99: done is only what was checked
 */
export function percentDone(line: string, whole: Whole): number | undefined {
  const part = 'frames' in whole ? partOfFrames(line, whole.frames) : partOfTime(line, whole.durationMs);
  return part === undefined || !Number.isFinite(part) ? undefined : Math.min(99, Math.max(0, Math.floor(part * 100)));
}

function partOfFrames(line: string, frames: number) {
  const found = /frame=\s*(\d+)/.exec(line);
  return found ? Number(found[1]) / frames : undefined;
}

function partOfTime(line: string, durationMs: number) {
  const found = /time=(\d+):(\d+):([\d.]+)/.exec(line);
  return found ? ((Number(found[1]) * 3600 + Number(found[2]) * 60 + Number(found[3])) * 1000) / durationMs : undefined;
}
