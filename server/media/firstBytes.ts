import type { FileHandle } from 'node:fs/promises';
import { fileTypeFromBuffer } from 'file-type';
import type { MediaFaultCode } from './mediaFault';

/** What a kind is told by lies in here, a lead-in of tags aside. */
const headBytes = 4100;

/** Text that tells a player to open something else: playlists, concat scripts, DASH and SDP descriptions, vector pictures. */
const pointsElsewhere =
  /^\s*(#EXTM3U|ffconcat\b|file\s+\S|\[playlist\]|\[reference\]|v=0\s|<\?xml|<!DOCTYPE|<svg|<MPD|<smil|<asx)/i;

/** Kinds whose readers the policy allows; everything else that is a video cannot be read here. */
const readable = new Set([
  'video/mp4',
  'video/x-m4v',
  'video/quicktime',
  'video/webm',
  'video/matroska',
  'video/mp2t',
  'video/vnd.avi',
  'video/3gpp',
  'video/3gpp2',
  'audio/mp4',
  'audio/x-m4a',
]);

/**
 * What a file's first bytes rule out before any reader of media opens it; its name and announced type are never asked.
 * @returns the fault, or undefined where the bytes may be a recording
 */
export async function faultOfFirstBytes(file: FileHandle): Promise<MediaFaultCode | undefined> {
  const { buffer, bytesRead } = await file.read(Buffer.alloc(headBytes), 0, headBytes, 0);
  const head = buffer.subarray(0, bytesRead);
  if (isText(head)) return pointsElsewhere.test(withoutMark(head)) ? 'disguised' : 'notVideo';
  const mime = (await fileTypeFromBuffer(head))?.mime;
  if (mime === undefined || readable.has(mime)) return undefined;
  if (mime.startsWith('video/')) return 'unsupported';
  return mime.startsWith('audio/') || mime.startsWith('image/') ? 'noPicture' : 'notVideo';
}

/** No format that holds pictures does without bytes below a tab. */
const isText = (head: Buffer) =>
  head.length > 0 && head.every((byte) => byte >= 0x20 || (byte >= 0x09 && byte <= 0x0d) || byte === 0x1b);

const withoutMark = (head: Buffer) => head.toString('utf8').replace(/^\uFEFF/, '');
