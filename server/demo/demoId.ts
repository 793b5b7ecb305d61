import { createHash } from 'node:crypto';

/**
 * A UUID that is always the same for the same words, shaped as version 5: seeding twice makes the same rows.
 * @param parts for instance the team's slug, "movement" and the movement's slug
 */
export function demoId(...parts: readonly string[]): string {
  const bytes = createHash('sha1')
    .update(`tapeline demo/${parts.join('/')}`)
    .digest()
    .subarray(0, 16);
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x50;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  const hex = bytes.toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
