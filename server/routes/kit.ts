import * as contract from '../../shared/contracts/kit';
import * as kit from '../services/kit';
import * as myKit from '../services/myKit';
import { on, type Route } from './on';

export const kitRoutes: Route[] = [
  on(contract.listKit, async ({ actor }) => ({ items: await kit.list(actor) })),
  on(contract.addKitItem, ({ actor, body }) => kit.add(actor, body)),
  on(contract.updateKitItem, ({ actor, params, body }) => kit.update(actor, params.kitItemId, body)),
  on(contract.getMyKit, async ({ actor }) => ({ items: (await myKit.kitOf(actor)).items })),
  on(contract.saveMyKit, async ({ actor, body }) => ({ items: await myKit.save(actor, body.items) })),
];
