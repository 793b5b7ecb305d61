import * as account from './account';
import type { Endpoint } from './endpoint';
import * as kit from './kit';
import * as live from './live';
import * as marks from './marks';
import * as movements from './movements';
import * as people from './people';
import * as recordings from './recordings';
import * as search from './search';
import * as sessions from './sessions';
import * as watch from './watch';

const modules = { account, people, kit, movements, sessions, recordings, marks, watch, search, live };

const isEndpoint = (value: unknown): value is Endpoint =>
  typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'may' in value;

/** Every operation of the API with its name, by resource: what the OpenAPI document, the router's check and the role matrix read. */
export const allEndpoints: readonly { tag: string; name: string; endpoint: Endpoint }[] = Object.entries(
  modules,
).flatMap(([tag, module]) =>
  Object.entries(module).flatMap(([name, value]) => (isEndpoint(value) ? [{ tag, name, endpoint: value }] : [])),
);
