import { readConfig } from '../config';
import { seedDemoTeam } from '../demo/seed';
import { migrate } from '../migrations/migrate';
import { closeDatabase, connectDatabase } from '../models/database';
import { connectServices } from '../services/context';

/** Brings the database to the newest schema and, where it is empty, the demo team into it; then tells the parent and ends. */
const config = readConfig(process.env);
await migrate(config.databaseUrl);
if (process.env.DEMO_TEAM !== 'no') {
  connectDatabase(config.databaseUrl);
  const { store } = connectServices(config);
  const { seeded, signIns } = await seedDemoTeam();
  process.send?.({ seeded, signIns });
  await closeDatabase();
  store.close();
}
