/**
 * Cuts an H.264 byte stream into its pictures ("access units").
 * ITU-T H.264 Annex B: a NAL unit follows 00 00 01; 7.4.1.2.3: an access unit delimiter (type 9), where present, is the first of its picture.
 */
export function accessUnits(stream: Buffer): Buffer[] {
  const starts: number[] = [];
  for (let at = stream.indexOf(startCode); at >= 0; at = stream.indexOf(startCode, at + 3)) {
    if (((stream[at + 3] ?? 0) & 0x1f) !== delimiter) continue;
    // a fourth byte of zero before the code belongs to the unit that follows
    starts.push(at > 0 && stream[at - 1] === 0 ? at - 1 : at);
  }
  return starts.map((start, i) => stream.subarray(start, starts[i + 1] ?? stream.length));
}

const startCode = Buffer.from([0, 0, 1]);
const delimiter = 9;
