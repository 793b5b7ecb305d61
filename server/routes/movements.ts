import * as contract from '../../shared/contracts/movements';
import { merge } from '../services/mergeMovements';
import * as pictures from '../services/movementPictures';
import * as movements from '../services/movements';
import * as substitutions from '../services/substitutions';
import { on, type Route } from './on';

export const movementRoutes: Route[] = [
  on(contract.listMovements, ({ actor, query }) => movements.list(actor, query)),
  on(contract.listMovementNames, async ({ actor }) => ({ items: await movements.names(actor) })),
  on(contract.getMovement, ({ actor, params }) => movements.read(actor, params.movementId)),
  on(contract.createMovement, ({ actor, body }) => movements.create(actor, body)),
  on(contract.updateMovement, ({ actor, params, body }) => movements.update(actor, params.movementId, body)),
  on(contract.mergeMovements, ({ actor, params, body }) => merge(actor, params.movementId, body)),
  on(contract.setMovementPicture, ({ actor, params, file }) =>
    pictures.setPicture(actor, params.movementId, file.bytes),
  ),
  on(contract.removeMovementPicture, ({ actor, params }) => pictures.removePicture(actor, params.movementId)),
  on(contract.addSubstitution, ({ actor, params, body }) => substitutions.add(actor, params.movementId, body)),
  on(contract.updateSubstitution, ({ actor, params, body }) =>
    substitutions.update(actor, params.movementId, params.substitutionId, body),
  ),
  on(contract.removeSubstitution, async ({ actor, params }) => {
    await substitutions.remove(actor, params.movementId, params.substitutionId);
    return {};
  }),
];
