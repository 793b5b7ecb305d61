import type { Config } from '../../config';
import type { Handler } from '../handler';

/** Every job that the worker can do. */
export function allHandlers(_config: Config): Handler[] {
  return [];
}
