import { AppError } from '../../shared/errors';
import { limits } from '../../shared/limits';

/** What can be told of a file before its first byte: its name, type and size. What it really is, the worker finds out. */

/** Endings of the containers that phones, cameras and editing programs write. */
const endings = new Set(['mp4', 'm4v', 'mov', 'qt', 'webm', 'mkv', 'avi', 'ts', 'mts', 'm2ts', '3gp', '3g2']);

/** Browsers that don't know an ending announce nothing, or just bytes. */
const unknownTypes = new Set(['', 'application/octet-stream']);

/** @throws AppError `wrongType` where name and type don't both allow a video */
export function requireVideoFile(fileName: string, contentType: string): void {
  const ending = /\.([a-z0-9]{1,8})$/i.exec(fileName)?.[1]?.toLowerCase();
  const type = contentType.split(';')[0]?.trim().toLowerCase() ?? '';
  const isVideo = type.startsWith('video/') || (ending !== undefined && unknownTypes.has(type));
  if (isVideo && (ending === undefined || endings.has(ending))) return;
  throw new AppError('wrongType', {
    message: 'This is not a video file that can be used here. Choose the recording as MP4, MOV, WebM or MKV.',
    fields: { fileName: 'Choose a video file.' },
  });
}

/** The type that an original is stored under: never one that a browser would run. */
export function storedType(contentType: string): string {
  const type = contentType.split(';')[0]?.trim().toLowerCase() ?? '';
  return /^video\/[a-z0-9.+-]+$/.test(type) ? type : 'application/octet-stream';
}

const MB = 1024 * 1024;

/**
 * How a file is divided into parts, all of the same size but the last.
 * Source: Amazon S3 User Guide, "Multipart upload limits": 1 to 10,000 parts of at least 5 MiB, the last one may be smaller.
 */
export function partsOfFile(sizeBytes: number): { partBytes: number; partCount: number } {
  const least = Math.ceil(sizeBytes / limits.uploadParts / MB) * MB;
  const partBytes = Math.max(limits.uploadPartBytes, least);
  return { partBytes, partCount: Math.ceil(sizeBytes / partBytes) };
}

/** How many bytes the part of a number has to have. @param number from 1 */
export function bytesOfPart(
  upload: { sizeBytes: number; partBytes: number; partCount: number },
  number: number,
): number {
  return number < upload.partCount ? upload.partBytes : upload.sizeBytes - (upload.partCount - 1) * upload.partBytes;
}

/** A title from a file's name: without its ending, its separators as spaces. */
export function titleFromFileName(fileName: string): string {
  const words = plainFileName(fileName)
    .replace(/\.[a-z0-9]{1,8}$/i, '')
    .replace(/[_\s]+/g, ' ')
    .replace(/(?<=\D)-(?=\D)/g, ' ')
    .trim()
    .slice(0, 120)
    .trim();
  return words === '' ? 'Recording' : words;
}

/** One line of plain text, without the folders that some browsers send along. */
export function plainFileName(fileName: string): string {
  const name = fileName.split(/[/\\]/).at(-1) ?? '';
  // biome-ignore lint/suspicious/noControlCharactersInRegex: they are what is taken out
  return name.replace(/[\u0000-\u001f\u007f]/g, '').trim() || 'recording';
}
