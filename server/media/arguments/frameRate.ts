/** The rates at which cameras film and screens show, as ffmpeg takes them, slowest first. */
const usualRates = [
  { fps: 24_000 / 1001, written: '24000/1001' },
  { fps: 24, written: '24' },
  { fps: 25, written: '25' },
  { fps: 30_000 / 1001, written: '30000/1001' },
  { fps: 30, written: '30' },
  { fps: 50, written: '50' },
  { fps: 60_000 / 1001, written: '60000/1001' },
  { fps: 60, written: '60' },
];
const fastest = { fps: 60, written: '60' };

export type FrameRate = { fps: number; written: string };

/**
 * The constant rate at which a playback is made. A rate that is even and at most 60 is kept, as a fast movement is judged picture
 * by picture; filmed faster (slow motion), it becomes 60. An uneven rate becomes the first usual one, at most 60, that loses no more
 * than one picture in a hundred: 29.8 → 30, 30.02 → 30, 17 → 24.
 * Constant, because a moment must land on the same picture in every rendition and in every browser.
 */
export function playbackRate(source: { fps: number; evenRate: boolean }): FrameRate {
  const usual = usualRates.find((rate) => Math.abs(rate.fps - source.fps) < 0.005);
  if (usual) return usual;
  if (source.evenRate && source.fps < fastest.fps) return { fps: source.fps, written: source.fps.toFixed(3) };
  return (
    usualRates.filter(({ written }) => !written.includes('/')).find(({ fps }) => fps >= source.fps * 0.99) ?? fastest
  );
}
