import type { Sequelize } from 'sequelize';
import { initDictionary } from './dictionary';
import { initMarks } from './marks';
import { initPeople } from './people';
import { initRecordings } from './recordings';
import { initSessions } from './sessions';

/** Binds every model to a connection. */
export function initModels(sequelize: Sequelize): void {
  initPeople(sequelize);
  initDictionary(sequelize);
  initSessions(sequelize);
  initRecordings(sequelize);
  initMarks(sequelize);
}
