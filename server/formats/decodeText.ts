/** What a caption file's bytes say, and how they were read. `windows-1252` is a guess: the bytes are no UTF-8. */
export type DecodedText = { text: string; encoding: 'utf-8' | 'utf-16' | 'windows-1252' };

/**
 * Decodes a text file by its byte order mark, else as UTF-8, else as the Windows-1252 of older programs.
 * Source: WHATWG Encoding, "BOM sniff"; the decoder drops the mark itself.
 */
export function decodeText(bytes: Uint8Array): DecodedText {
  if (bytes[0] === 0xff && bytes[1] === 0xfe)
    return { text: new TextDecoder('utf-16le').decode(bytes), encoding: 'utf-16' };
  if (bytes[0] === 0xfe && bytes[1] === 0xff)
    return { text: new TextDecoder('utf-16be').decode(bytes), encoding: 'utf-16' };
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes), encoding: 'utf-8' };
  } catch {
    return { text: decodeWindows1252(bytes), encoding: 'windows-1252' };
  }
}

/**
 * 0x80–0x9F of Windows-1252; everything else is Latin-1. Node 20's own decoder takes these for control characters.
 * Source: WHATWG Encoding, index windows-1252.
 */
const upperRow = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ';

function decodeWindows1252(bytes: Uint8Array): string {
  const latin1 = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength).toString('latin1');
  return latin1.replace(/[\u0080-\u009f]/g, (character) => upperRow[character.charCodeAt(0) - 0x80] ?? character);
}
