import { randomUUID } from 'node:crypto';
import { KitItem, Movement, Substitution } from '../../server/models/dictionary';
import type { Person, Team } from '../../server/models/people';
import { Recording, RecordingAsset } from '../../server/models/recordings';
import { Block, BlockLine, Session } from '../../server/models/sessions';
import type { Chapter } from '../../shared/domain/chapters/chapter';
import type { KitNeed } from '../../shared/domain/kit/kit';
import type { Dose } from '../../shared/domain/training/dose';

/** What a team's library holds, made straight in the database. */

export const reps = (amount: number): Dose => ({
  amount,
  amountTo: null,
  unit: 'reps',
  perSide: false,
  load: null,
  tempo: null,
});

export const needs = (...items: KitItem[]): KitNeed[] =>
  items.map(({ id }) => ({ anyOf: [{ kitItemId: id, count: 1, minLoadKg: null }] }));

export const makeKitItem = (team: Team, name: string, withoutText = `no ${name}`) =>
  KitItem.create({ teamId: team.id, name, withoutText });

export const makeMovement = (
  team: Team,
  name: string,
  more: Partial<Pick<Movement, 'otherNames' | 'pattern' | 'kitNeeded' | 'cautions' | 'points'>> = {},
) => Movement.create({ teamId: team.id, name, pattern: 'pull', ...more });

export const makeSubstitution = (
  team: Team,
  from: Movement,
  to: Movement,
  missing: KitItem,
  reason = 'The same pull.',
) =>
  Substitution.create({
    teamId: team.id,
    fromMovementId: from.id,
    toMovementId: to.id,
    missing: 'kit',
    missingKitItemId: missing.id,
    doseRule: { type: 'times', factor: 1.5, cap: 15 },
    reason,
  });

type SessionOptions = {
  date?: string;
  title?: string;
  state?: 'draft' | 'published';
  coach?: Person;
  movements?: Movement[];
};

/** A session with one workout block that has a line for each movement. */
export async function makeSession(
  team: Team,
  { date = '2026-03-03', title = 'Step, row, hop', state = 'published', coach, movements = [] }: SessionOptions = {},
) {
  const session = await Session.create({
    teamId: team.id,
    date,
    title,
    state,
    publishedAt: state === 'published' ? new Date() : null,
    coachId: coach?.id ?? null,
  });
  const block = await Block.create({
    teamId: team.id,
    sessionId: session.id,
    position: 0,
    kind: 'workout',
    title: 'Workout',
    scheme: { type: 'amrap', minutes: 12 },
  });
  const lines = await BlockLine.bulkCreate(
    movements.map((movement, position) => ({
      teamId: team.id,
      blockId: block.id,
      position,
      movementId: movement.id,
      dose: reps(8),
    })),
  );
  return { session, block, lines };
}

type RecordingOptions = {
  session?: Session | null;
  coach?: Person;
  state?: 'making' | 'ready';
  durationMs?: number;
  title?: string;
};

/** A recording as it is once the worker is done; its bytes are not in the store. */
export async function makeRecording(
  team: Team,
  { session = null, coach, state = 'ready', durationMs = 60_000, title = 'First take' }: RecordingOptions = {},
) {
  const recording = await Recording.create({
    teamId: team.id,
    sessionId: session?.id ?? null,
    coachId: coach?.id ?? null,
    title,
    fileName: 'take.mp4',
    sizeBytes: 1000,
    contentType: 'video/mp4',
    state,
    durationMs,
    width: 1280,
    height: 720,
    fps: 30,
  });
  if (state === 'ready')
    await RecordingAsset.create({
      teamId: team.id,
      recordingId: recording.id,
      kind: 'playback',
      name: 'playback-made.mp4',
      contentType: 'video/mp4',
      sizeBytes: 1000,
      width: 1280,
      height: 720,
    });
  return recording;
}

/** A chapter as a client sends it. */
export const chapter = (startMs: number, endMs: number, more: Partial<Chapter> = {}): Chapter => ({
  id: randomUUID(),
  startMs,
  endMs,
  kind: 'demo',
  title: 'Ring row',
  note: '',
  blockId: null,
  movementId: null,
  standsInForMovementId: null,
  missing: null,
  missingKitItemId: null,
  ...more,
});
