import type { FileHandle } from 'node:fs/promises';

/** A file of footage has a handful of boxes on its top level; fragmented ones have two for each second or so. */
const mostBoxes = 100_000;

/** A file that lacks less than this part of what it announces may still be whole enough; its length decides later. */
const toleratedLoss = 0.02;

export type BoxFault = 'noIndex' | 'cutShort';

/**
 * Whether an MP4 or MOV file has lost its end: its boxes say how long they are, so it shows without decoding anything.
 * Source: ISO/IEC 14496-12, 4.2: a box opens with its size (32 bits) and type; size 1 means 64 bits follow, size 0 "to the end of the file".
 * @param bytes the file's size
 * @returns undefined for whole files and for files that are not made of boxes
 */
export async function faultOfBoxes(file: FileHandle, bytes: number): Promise<BoxFault | undefined> {
  const header = Buffer.alloc(16);
  let at = 0;
  let hasIndex = false;
  for (let i = 0; i < mostBoxes && at + 8 <= bytes; i++) {
    const { bytesRead } = await file.read(header, 0, 16, at);
    const type = header.toString('latin1', 4, 8);
    if (bytesRead < 8 || (i === 0 && !firstBoxes.has(type))) return undefined;
    if (type === 'moov') hasIndex = true;
    const size = header.readUInt32BE(0);
    if (size === 0) {
      at = bytes;
      break;
    }
    const length = size === 1 ? Number(header.readBigUInt64BE(8)) : size;
    // not a box: what follows the last whole one is left to the reader
    if (length < 8) break;
    at += length;
  }
  if (at === 0) return undefined;
  if (!hasIndex) return 'noIndex';
  return at - bytes > at * toleratedLoss ? 'cutShort' : undefined;
}

const firstBoxes = new Set(['ftyp', 'moov', 'mdat', 'free', 'skip', 'wide', 'styp', 'pnot', 'uuid']);
