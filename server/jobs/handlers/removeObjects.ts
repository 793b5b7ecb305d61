import { store } from '../../services/context';
import { removeObjects } from '../definitions';
import { handle } from '../handler';

/** Takes everything under the prefixes away; done again it finds nothing left to do. */
export const removeObjectsHandler = handle(removeObjects, async ({ prefixes }, { signal }) => {
  for (const prefix of prefixes)
    for await (const key of store().list(prefix)) {
      signal.throwIfAborted();
      await store().remove(key);
    }
});
