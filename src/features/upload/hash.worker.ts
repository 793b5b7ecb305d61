/** Hashes parts away from the page; one part at a time is in memory for each that is asked for. */

export type HashQuestion = { id: number; bytes: Blob };
export type HashAnswer = { id: number; sha256: string } | { id: number; fault: string };

self.addEventListener('message', async ({ data }: MessageEvent<HashQuestion>) => {
  self.postMessage(await answerTo(data));
});

async function answerTo({ id, bytes }: HashQuestion): Promise<HashAnswer> {
  try {
    const digest = await crypto.subtle.digest('SHA-256', await bytes.arrayBuffer());
    return { id, sha256: btoa(String.fromCharCode(...new Uint8Array(digest))) };
  } catch (error) {
    return { id, fault: error instanceof Error ? error.name : 'unknown' };
  }
}
