import * as contract from '../../shared/contracts/search';
import * as search from '../services/search';
import { on, type Route } from './on';

export const searchRoutes: Route[] = [
  on(contract.find, ({ actor, query }) => search.find(actor, query)),
  on(contract.suggest, ({ actor, query }) => search.suggest(actor, query.q)),
];
