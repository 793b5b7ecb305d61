import type { KitNeed } from '../../shared/domain/kit/kit';
import { drawDemoRecording, enqueue } from '../jobs/definitions';
import { inTransaction } from '../models/database';
import { KitItem, MemberKit, Movement, Substitution } from '../models/dictionary';
import { Membership, Person, Team } from '../models/people';
import { Recording, RecordingStep } from '../models/recordings';
import { Block, BlockLine, LineSubstitution, Session } from '../models/sessions';
import { hashPassword } from '../services/passwords';
import { dateInZone } from '../services/teamDay';
import { demoId } from './demoId';
import { demoPassword, people } from './scenario/people';
import { demoTeams } from './scenario/scenario';
import type { DemoBlock, DemoKitNeed, DemoSession, DemoTeam } from './scenario/shapes';

export type DemoSignIn = { role: string; email: string; password: string };

const dayMs = 24 * 60 * 60 * 1000;

/**
 * Puts the demo teams into an empty database, in one transaction; their recordings are then drawn by the worker, today's first.
 * @returns how to sign in as each role, also when the teams were there already
 */
export async function seedDemoTeam(): Promise<{ seeded: boolean; signIns: DemoSignIn[] }> {
  const seeded = await inTransaction(async () => {
    if ((await Team.count()) > 0) return false;
    const passwordHash = await hashPassword(demoPassword);
    await Person.bulkCreate(people.map(({ slug, name, email }) => ({ id: personId(slug), name, email, passwordHash })));
    for (const team of demoTeams) await seedTeam(team);
    return true;
  });
  return { seeded, signIns: await signInsOfDemo() };
}

const personId = (slug: string) => demoId('person', slug);

/** One person for each role of the first team, as long as they are in it. */
async function signInsOfDemo(): Promise<DemoSignIn[]> {
  const [first] = demoTeams;
  if (!first) return [];
  const members = await Membership.findAll({ where: { teamId: demoId(first.slug, 'team') } });
  const roleOf = new Map(members.map(({ personId: id, role }) => [id, role]));
  const shown = new Set<string>();
  return people.flatMap(({ slug, email }) => {
    const role = roleOf.get(personId(slug));
    if (!role || shown.has(role)) return [];
    shown.add(role);
    return [{ role, email, password: demoPassword }];
  });
}

async function seedTeam(demo: DemoTeam): Promise<void> {
  const id = (...parts: string[]) => demoId(demo.slug, ...parts);
  const teamId = id('team');
  await Team.create({ id: teamId, slug: demo.slug, name: demo.name, timeZone: demo.timeZone });
  await Membership.bulkCreate(
    demo.memberships.map(({ person, role }) => ({ teamId, personId: personId(person), role, kitToldAt: new Date() })),
  );
  await KitItem.bulkCreate(
    demo.kitItems.map(({ slug, otherNames, ...item }) => ({
      ...item,
      teamId,
      id: id('kit', slug),
      otherNames: [...otherNames],
    })),
  );
  await MemberKit.bulkCreate(
    demo.memberships.flatMap(({ person, kit }) =>
      kit.map(({ kit: slug, count, loadsKg }) => ({
        teamId,
        personId: personId(person),
        kitItemId: id('kit', slug),
        count,
        loadsKg: [...loadsKg],
      })),
    ),
  );
  const kitNeeded = (needs: readonly DemoKitNeed[]): KitNeed[] =>
    needs.map(({ anyOf }) => ({
      anyOf: anyOf.map(({ kit, count, minLoadKg }) => ({ kitItemId: id('kit', kit), count, minLoadKg })),
    }));
  await Movement.bulkCreate(
    demo.movements.map(({ slug, name, otherNames, pattern, kitNeeded: needs, points, faults, cautions }) => ({
      teamId,
      id: id('movement', slug),
      name,
      otherNames: [...otherNames],
      pattern,
      kitNeeded: kitNeeded(needs),
      points: [...points],
      faults: [...faults],
      cautions: [...cautions],
    })),
  );
  await Substitution.bulkCreate(
    demo.substitutions.map(({ from, to, missing, missingKit, doseRule, reason }) => ({
      teamId,
      id: id('substitution', from, to, missing, missingKit ?? ''),
      fromMovementId: id('movement', from),
      toMovementId: id('movement', to),
      missing,
      missingKitItemId: missingKit === null ? null : id('kit', missingKit),
      doseRule,
      reason,
    })),
  );
  // today's recording is drawn first, then the nearest ones
  for (const session of demo.sessions.toSorted((a, b) => Math.abs(a.dayOffset) - Math.abs(b.dayOffset)))
    await seedSession(demo, session);
}

async function seedSession(demo: DemoTeam, session: DemoSession): Promise<void> {
  const id = (...parts: string[]) => demoId(demo.slug, ...parts);
  const teamId = id('team');
  const sessionId = id('session', session.slug);
  const date = dateInZone(demo.timeZone, new Date(Date.now() + session.dayOffset * dayMs));
  await Session.create({
    teamId,
    id: sessionId,
    date,
    title: session.title,
    note: session.note,
    aim: session.aim,
    coachId: personId(session.coach),
    state: session.state,
    publishedAt: session.state === 'published' ? new Date(Date.parse(date) - dayMs / 4) : null,
  });
  for (const [position, block] of session.blocks.entries()) await seedBlock(demo, session, block, position);
  if (session.recording) await seedRecording(demo, session, sessionId, date);
}

async function seedBlock(demo: DemoTeam, session: DemoSession, block: DemoBlock, position: number): Promise<void> {
  const id = (...parts: string[]) => demoId(demo.slug, ...parts);
  const teamId = id('team');
  const blockId = id('session', session.slug, 'block', block.slug);
  const { kind, title, scheme, note } = block;
  await Block.create({
    teamId,
    id: blockId,
    sessionId: id('session', session.slug),
    position,
    kind,
    title,
    scheme,
    note,
  });
  for (const [linePosition, line] of block.lines.entries()) {
    const lineId = id('session', session.slug, 'block', block.slug, 'line', String(linePosition));
    await BlockLine.create({
      teamId,
      id: lineId,
      blockId,
      position: linePosition,
      movementId: id('movement', line.movement),
      dose: line.dose,
      note: line.note,
    });
    await LineSubstitution.bulkCreate(
      line.substitutions.map(({ movement, missing, missingKit, dose, reason }, at) => ({
        teamId,
        lineId,
        position: at,
        movementId: id('movement', movement),
        missing,
        missingKitItemId: missingKit === null ? null : id('kit', missingKit),
        dose,
        reason,
      })),
    );
  }
}

/** The row now, the picture later: the library can be used before the worker has drawn it. */
async function seedRecording(demo: DemoTeam, session: DemoSession, sessionId: string, date: string): Promise<void> {
  const { recording } = session;
  if (!recording) return;
  const teamId = demoId(demo.slug, 'team');
  const recordingId = demoId(demo.slug, 'recording', recording.slug);
  await Recording.create({
    teamId,
    id: recordingId,
    sessionId,
    coachId: personId(recording.coach),
    title: recording.title,
    fileName: recording.fileName,
    sizeBytes: 0,
    contentType: 'video/mp4',
    state: 'making',
    // uploaded on the morning of its day, so that lists are in the order of the days
    createdAt: new Date(Math.min(Date.now(), Date.parse(date) + dayMs / 4)),
  });
  await RecordingStep.create({ teamId, recordingId, step: 'drawing' });
  await enqueue(drawDemoRecording, { teamId, recordingId, script: `${demo.slug}/${session.slug}` });
}
