export type FrameSize = { width: number; height: number };

/**
 * The largest size within a box that keeps the picture's shape, never above the source. Sides are even, as 4:2:0 asks for.
 * The box has no orientation: a portrait picture is measured with its long side against the box's long side.
 */
export function fitWithin(source: FrameSize, box: { long: number; short: number }): FrameSize {
  const long = Math.max(source.width, source.height);
  const short = Math.min(source.width, source.height);
  const scale = Math.min(1, box.long / long, box.short / short);
  return { width: even(source.width * scale), height: even(source.height * scale) };
}

const even = (side: number) => Math.max(2, 2 * Math.floor(side / 2 + 1e-6));
