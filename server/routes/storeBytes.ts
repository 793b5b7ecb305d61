import http, { type IncomingMessage } from 'node:http';
import https from 'node:https';
import { AppError } from '../../shared/errors';
import { store } from '../services/context';

/** The store's bytes by a plain request to a signed address: half the processor time of the SDK's own reader. */

const addressSeconds = 3600;
/** a store that says nothing for so long does not answer */
const silenceMs = 15_000;
/** signing costs more than a range's bytes do: an address is used again until shortly before it ends */
const addresses = new Map<string, { url: URL; until: number }>();
const agents = {
  'http:': new http.Agent({ keepAlive: true, maxSockets: 256, timeout: 60_000 }),
  'https:': new https.Agent({ keepAlive: true, maxSockets: 256, timeout: 60_000 }),
};

/**
 * Opens an object for reading. The signal ends it at any time, its connection with it.
 * @param range of the reader, passed on as it is
 * @returns the store's answer, whatever its status
 * @throws AppError `unavailable`; the signal's error on abort
 */
export async function openBytes(key: string, range: string | undefined, signal: AbortSignal): Promise<IncomingMessage> {
  const url = await addressOf(key);
  return new Promise((resolve, reject) => {
    const secure = url.protocol === 'https:';
    const request = (secure ? https : http).get(url, {
      agent: agents[secure ? 'https:' : 'http:'],
      headers: range === undefined ? {} : { range },
      signal,
      timeout: silenceMs,
    });
    request.on('timeout', () => request.destroy(new Error('The store says nothing.')));
    request.on('error', (error) => reject(signal.aborted ? error : new AppError('unavailable')));
    request.on('response', (answer) => {
      // another key pair, or another clock: the next reader gets a new address
      if (answer.statusCode === 403) addresses.delete(key);
      resolve(answer);
    });
  });
}

async function addressOf(key: string): Promise<URL> {
  const known = addresses.get(key);
  if (known && known.until > Date.now()) return known.url;
  if (addresses.size > 5000) addresses.clear();
  const url = new URL(await store().presignRead(key, addressSeconds));
  addresses.set(key, { url, until: Date.now() + (addressSeconds - 300) * 1000 });
  return url;
}

/** Connections to the store that are open and in use right now, for the metrics and the tests. */
export function readsInProgress(): number {
  return Object.values(agents)
    .flatMap((agent) => Object.values(agent.sockets))
    .reduce((sum, sockets) => sum + (sockets?.length ?? 0), 0);
}
