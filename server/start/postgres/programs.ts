import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

const debianFolder = '/usr/lib/postgresql';

/**
 * The folder with `initdb` and `postgres`: the version that made the data where there is data, else the newest.
 * PG_BIN in the environment names another folder.
 */
export function programsFor(dataFolder: string): string {
  const made = path.join(dataFolder, 'PG_VERSION');
  const version = existsSync(made) ? readFileSync(made, 'utf8').trim() : undefined;
  const installed = existsSync(debianFolder) ? readdirSync(debianFolder).sort((a, b) => Number(b) - Number(a)) : [];
  const candidates = [
    process.env.PG_BIN,
    ...installed
      .filter((name) => version === undefined || name === version)
      .map((name) => `${debianFolder}/${name}/bin`),
  ];
  const found = candidates.find((folder) => folder && existsSync(path.join(folder, 'initdb')));
  if (found) return found;
  throw new Error(
    version === undefined
      ? 'No PostgreSQL server is installed: apt-get install --no-install-recommends postgresql'
      : `The data in ${dataFolder} was made by PostgreSQL ${version}, which is not installed: apt-get install --no-install-recommends postgresql-${version}`,
  );
}
