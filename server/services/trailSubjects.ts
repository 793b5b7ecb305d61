import type { Model, ModelStatic, WhereOptions } from 'sequelize';
import { KitItem, Movement, Substitution } from '../models/dictionary';
import { type AuditEvent, Person } from '../models/people';
import { Recording } from '../models/recordings';
import { Session } from '../models/sessions';

/**
 * What each entry is about, by name, as far as it is still there: a session's and a recording's title, a movement's, kit
 * item's and person's name, for a substitution the movement that it stands in for.
 * @returns names by subject id; what is gone has none
 */
export async function subjectNames(
  teamId: string,
  events: readonly AuditEvent[],
): Promise<ReadonlyMap<string, string>> {
  const idsOf = (type: string) => [
    ...new Set(events.flatMap((event) => (event.subjectType === type && event.subjectId ? [event.subjectId] : []))),
  ];
  const named = async <M extends Model & { id: string }>(
    model: ModelStatic<M>,
    type: string,
    nameOf: (row: M) => string,
    team: object = { teamId },
  ): Promise<[string, string][]> => {
    const id = idsOf(type);
    if (id.length === 0) return [];
    const rows = await model.findAll({ where: { ...team, id } as WhereOptions });
    return rows.map((row) => [row.id, nameOf(row)]);
  };
  const ways = await named(Substitution, 'substitution', (row) => row.fromMovementId);
  const froms = await Movement.findAll({
    where: { teamId, id: ways.map(([, from]) => from) },
    attributes: ['id', 'name'],
  });
  const nameOfMovement = new Map(froms.map(({ id, name }) => [id, name]));
  const lists = await Promise.all([
    named(Session, 'session', (session) => session.title),
    named(Recording, 'recording', (recording) => recording.title),
    named(Movement, 'movement', (movement) => movement.name),
    named(KitItem, 'kitItem', (item) => item.name),
    // an entry of this team names the person; people belong to no team alone
    named(Person, 'person', (person) => person.name, {}),
  ]);
  const instead = ways.flatMap(([id, from]): [string, string][] => {
    const name = nameOfMovement.get(from);
    return name === undefined ? [] : [[id, `instead of ${name}`]];
  });
  return new Map([...lists.flat(), ...instead]);
}
