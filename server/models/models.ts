import type { Sequelize } from 'sequelize';
import { initDictionary } from './dictionary';
import { initMarks } from './marks';
import { initPeople } from './people';
import { initRecordings } from './recordings';
import { initSessions } from './sessions';

/** Binds every model to a connection. */
export function initModels(sequelize: Sequelize): void {
  // Sequelize writes each column's name into its definition, and the shorthands of columns.ts are many columns' own
  sequelize.addHook('beforeDefine', (attributes) => {
    for (const [name, definition] of Object.entries(attributes))
      Object.assign(attributes, { [name]: { ...(definition as object) } });
  });
  initPeople(sequelize);
  initDictionary(sequelize);
  initSessions(sequelize);
  initRecordings(sequelize);
  initMarks(sequelize);
}
