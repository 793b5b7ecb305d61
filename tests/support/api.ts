import { randomBytes, randomUUID } from 'node:crypto';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { QueryTypes } from 'sequelize';
import request from 'supertest';
import type { z } from 'zod';
import { createApp } from '../../server/app';
import { type Config, readConfig } from '../../server/config';
import { type JobDefinition, sendMail } from '../../server/jobs/definitions';
import { openLog } from '../../server/middleware/log';
import { closeDatabase, connectDatabase, database } from '../../server/models/database';
import { Membership, Person, Team } from '../../server/models/people';
import { connectServices } from '../../server/services/context';
import { hashPassword } from '../../server/services/passwords';
import { type Role, roles } from '../../shared/domain/words';
import { freshDatabase } from './database';
import { freshStore, storeEnvironment } from './store';

/** A browser of one's own: keeps its cookies, comes from its own address. `get('/api/…')`, `post('/api/…').send({ … })`. */
export type Visitor = ReturnType<typeof request.agent>;

export type Api = {
  config: Config;
  /** where it listens, for what supertest can't do (streams, broken requests) */
  url: string;
  /** nobody is signed in */
  visitor(): Visitor;
  /** signs in through the API; for people made by `makePerson` */
  signedIn(person: Person): Promise<Visitor>;
  close(): Promise<void>;
};

/**
 * The web process's app on a database and a bucket of its own; one at a time in a test file.
 * The worker does not run: see `queuedJobs` and `mailTo` for what was asked of it.
 * @param environment variables beside the usual ones
 */
export async function startApi(environment: Record<string, string> = {}): Promise<Api> {
  const [own, bucket] = await Promise.all([freshDatabase(), freshStore()]);
  const config = readConfig({
    NODE_ENV: 'test',
    DATABASE_URL: own.url,
    ...storeEnvironment(bucket),
    SMTP_URL: 'smtp://127.0.0.1:9',
    SESSION_SECRET: randomBytes(32).toString('base64url'),
    MEDIA_SECRET: randomBytes(32).toString('base64url'),
    LOG_LEVEL: 'fatal',
    // each visitor says its own address, so that the limits by address count them apart
    TRUSTED_PROXIES: '1',
    ...environment,
  });
  connectDatabase(config.databaseUrl, 5);
  const { store } = connectServices(config);
  const app = await createApp(config, openLog(config.logLevel, 'web'));
  const server = createServer(app.express);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const visitor = () => request.agent(server).set('X-Forwarded-For', freshAddress());

  return {
    config,
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    visitor,
    async signedIn(person) {
      const browser = visitor();
      await browser.post('/api/sign-in').send({ email: person.email, password: testPassword }).expect(200);
      return browser;
    },
    async close() {
      const closed = new Promise((resolve) => server.close(resolve));
      await app.close();
      server.closeAllConnections();
      await closed;
      await closeDatabase();
      store.close();
      await own.drop();
    },
  };
}

let addresses = 0;

/** An address that nobody else in this file has. */
export function freshAddress(): string {
  addresses++;
  return `10.0.${Math.floor(addresses / 250)}.${1 + (addresses % 250)}`;
}

/** What everybody made here signs in with. */
export const testPassword = 'seven quiet lamps on a shelf';
let testHash: Promise<string> | undefined;

export async function makePerson({ name = 'Ilva Marten', email = `${randomUUID()}@mail.example` } = {}) {
  testHash ??= hashPassword(testPassword);
  return Person.create({ name, email, passwordHash: await testHash });
}

export async function makeTeam({ name = 'Quayside', timeZone = 'Europe/Berlin' } = {}) {
  return Team.create({ slug: `team-${randomBytes(5).toString('hex')}`, name, timeZone });
}

export async function makeMembership(team: Team, person: Person, role: Role) {
  return Membership.create({ teamId: team.id, personId: person.id, role });
}

/** A person who is in the team. */
export async function makeMember(team: Team, role: Role, named: { name?: string; email?: string } = {}) {
  const person = await makePerson(named);
  await makeMembership(team, person, role);
  return person;
}

export type TeamOfFour = { team: Team } & Record<Role, Person>;

/** A team with one person of each role. */
export async function makeTeamOfFour(): Promise<TeamOfFour> {
  const team = await makeTeam();
  const people = await Promise.all(
    roles.map(async (role) => [role, await makeMember(team, role, { name: `The ${role}` })]),
  );
  return { team, ...(Object.fromEntries(people) as Record<Role, Person>) };
}

/** The payloads of a job that wait in the queue, oldest first. */
export async function queuedJobs<P extends z.ZodObject>(definition: JobDefinition<P>): Promise<z.infer<P>[]> {
  // the queue's public view leaves the payload out
  const rows = await database().query<{ payload: unknown }>(
    `select jobs.payload from graphile_worker._private_jobs jobs
     join graphile_worker._private_tasks tasks on tasks.id = jobs.task_id
     where tasks.identifier = :name order by jobs.id`,
    { replacements: { name: definition.name }, type: QueryTypes.SELECT },
  );
  return rows.map((row) => definition.payload.parse(row.payload) as z.infer<P>);
}

/** The mails that wait to be sent to somebody, oldest first, with the secret of the link in each (empty where there is none). */
export async function mailTo(email: string): Promise<{ subject: string; text: string; secret: string }[]> {
  const mails = (await queuedJobs(sendMail)).filter((mail) => mail.to === email);
  return mails.map(({ subject, text }) => ({ subject, text, secret: /#(\S+)/.exec(text)?.[1] ?? '' }));
}
