import { describe, expect, it } from 'vitest';
import { demoId } from '../../server/demo/demoId';
import { motionNames } from '../../server/demo/drawing/motions';
import { demoPassword, people } from '../../server/demo/scenario/people';
import { demoTeams } from '../../server/demo/scenario/scenario';
import type { DemoMovement, DemoTeam } from '../../server/demo/scenario/shapes';
import { CaptionLine } from '../../shared/domain/captions/captionLine';
import { Chapter } from '../../shared/domain/chapters/chapter';
import { Cue } from '../../shared/domain/chapters/cue';
import { DoseRule } from '../../shared/domain/kit/doseRule';
import { KitNeed, OwnedKit } from '../../shared/domain/kit/kit';
import { Caution } from '../../shared/domain/training/caution';
import { Dose } from '../../shared/domain/training/dose';
import { Scheme } from '../../shared/domain/training/scheme';
import { Id } from '../../shared/domain/values';
import { patterns, roles } from '../../shared/domain/words';
import { limits } from '../../shared/limits';

const loft = demoTeams[0] as DemoTeam;

const twice = (values: readonly string[]) => values.filter((value, i) => values.indexOf(value) !== i);
const movementIn = (team: DemoTeam, slug: string) => team.movements.find((movement) => movement.slug === slug);
const kitOf = (movement: DemoMovement | undefined) =>
  movement?.kitNeeded.flatMap((need) => need.anyOf.map((option) => option.kit)) ?? [];
const linesOf = (team: DemoTeam) => team.sessions.flatMap(({ blocks }) => blocks.flatMap(({ lines }) => lines));
const recordingsOf = (team: DemoTeam) => team.sessions.flatMap(({ recording }) => recording ?? []);

describe('the demo team', () => {
  it('is as large as it was asked to be', () => {
    expect(loft.memberships.length).toBeGreaterThanOrEqual(10);
    expect(loft.movements.length).toBeGreaterThanOrEqual(60);
    expect(loft.substitutions.length).toBeGreaterThanOrEqual(40);
    expect(loft.sessions.length).toBeGreaterThanOrEqual(8);
    expect(loft.kitItems.length).toBeGreaterThanOrEqual(14);
    expect(recordingsOf(loft)).toHaveLength(5);
  });

  it('has all four roles, a member without any kit and members with different kit', () => {
    expect(new Set(loft.memberships.map(({ role }) => role))).toEqual(new Set(roles));
    const members = loft.memberships.filter(({ role }) => role === 'member');
    expect(members.length).toBeGreaterThanOrEqual(7);
    expect(members.some(({ kit }) => kit.length === 0)).toBe(true);
    const kits = members.map(({ kit }) => kit.map(({ kit }) => kit).join());
    expect(twice(kits)).toEqual([]);
  });

  it('has somebody with another role in the second team', () => {
    const roleIn = (team: DemoTeam | undefined, person: string) =>
      team?.memberships.find((membership) => membership.person === person)?.role;
    expect(
      people.some(({ slug }) => {
        const [here, there] = demoTeams.map((team) => roleIn(team, slug));
        return here !== undefined && there !== undefined && here !== there;
      }),
    ).toBe(true);
  });

  it('covers every pattern', () => {
    expect(new Set(loft.movements.map(({ pattern }) => pattern))).toEqual(new Set(patterns));
  });

  it('spans two weeks with today and tomorrow, drafts only from tomorrow on', () => {
    const offsets = loft.sessions.map(({ dayOffset }) => dayOffset);
    expect(offsets).toEqual(offsets.toSorted((a, b) => a - b));
    expect(offsets).toEqual(expect.arrayContaining([0, 1]));
    expect(Math.max(...offsets) - Math.min(...offsets)).toBeGreaterThanOrEqual(13);
    for (const { dayOffset, state } of loft.sessions) expect(state).toBe(dayOffset > 0 ? 'draft' : 'published');
  });

  it('has chains: what stands in for one movement may itself need something', () => {
    const from = new Set(loft.substitutions.map((substitution) => substitution.from));
    expect(loft.substitutions.filter(({ to }) => from.has(to)).length).toBeGreaterThanOrEqual(5);
  });

  it('has footage for today and gaps elsewhere', () => {
    expect(loft.sessions.find(({ dayOffset }) => dayOffset === 0)?.recording).not.toBeNull();
    expect(loft.sessions.some(({ recording, state }) => recording === null && state === 'published')).toBe(true);
  });

  it('gives everybody an address that can never receive mail, and a password that the rule takes', () => {
    for (const { email } of people) expect(email).toMatch(/^[a-z]+@[a-z-]+\.example$/);
    expect(demoPassword.length).toBeGreaterThanOrEqual(limits.passwordMin);
  });
});

describe('an id made from words', () => {
  it('is a UUID, the same every time, and different for different words', () => {
    expect(Id.safeParse(demoId('apple-loft', 'movement', 'plank')).success).toBe(true);
    expect(demoId('a', 'b')).toBe(demoId('a', 'b'));
    expect(demoId('a', 'b')).not.toBe(demoId('a', 'c'));
    expect(demoId('a', 'b')[14]).toBe('5');
  });
});

describe.each(demoTeams.map((team) => [team.name, team] as const))('the scenario of %s', (_name, team) => {
  const kitSlugs = new Set(team.kitItems.map(({ slug }) => slug));
  const movementSlugs = new Set(team.movements.map(({ slug }) => slug));
  const personSlugs = new Set<string>(people.map(({ slug }) => slug));
  const kitId = (kit: string) => demoId(team.slug, 'kit', kit);

  it('uses each slug and each movement name once, other names included', () => {
    expect(twice(team.movements.map(({ slug }) => slug))).toEqual([]);
    expect(
      twice(team.movements.flatMap(({ name, otherNames }) => [name, ...otherNames].map((n) => n.toLowerCase()))),
    ).toEqual([]);
    expect(twice(team.kitItems.flatMap(({ name, otherNames }) => [...new Set([name, ...otherNames])]))).toEqual([]);
    expect(twice(team.sessions.map(({ slug }) => slug))).toEqual([]);
  });

  it('names only kit, movements and people that exist', () => {
    for (const { person, kit } of team.memberships) {
      expect(personSlugs).toContain(person);
      for (const owned of kit) expect(kitSlugs).toContain(owned.kit);
    }
    for (const movement of team.movements) for (const kit of kitOf(movement)) expect(kitSlugs).toContain(kit);
    for (const { coach } of team.sessions) expect(personSlugs).toContain(coach);
    for (const { movement, substitutions } of linesOf(team)) {
      expect(movementSlugs).toContain(movement);
      for (const substitution of substitutions) expect(movementSlugs).toContain(substitution.movement);
    }
  });

  it('has kit, cautions, doses, schemes and dose rules in the shapes that the product takes', () => {
    for (const { kit } of team.memberships) {
      for (const { kit: slug, count, loadsKg } of kit) OwnedKit.parse({ kitItemId: kitId(slug), count, loadsKg });
    }
    for (const { kitNeeded, cautions, points, faults } of team.movements) {
      for (const { anyOf } of kitNeeded) {
        KitNeed.parse({
          anyOf: anyOf.map(({ kit, count, minLoadKg }) => ({ kitItemId: kitId(kit), count, minLoadKg })),
        });
      }
      for (const caution of cautions) expect(Caution.parse(caution).more).not.toBe('');
      expect(points.length).toBeGreaterThanOrEqual(2);
      expect(faults.length).toBeGreaterThanOrEqual(1);
    }
    for (const { doseRule } of team.substitutions) DoseRule.parse(doseRule);
    for (const { blocks } of team.sessions) for (const { scheme } of blocks) if (scheme) Scheme.parse(scheme);
    for (const { dose, substitutions } of linesOf(team)) {
      expect(Dose.parse(dose)).toEqual(dose);
      for (const substitution of substitutions) Dose.parse(substitution.dose);
    }
  });

  it('asks for a load only of kit whose load matters', () => {
    const loaded = new Set(team.kitItems.filter(({ loadMatters }) => loadMatters).map(({ slug }) => slug));
    for (const { kitNeeded } of team.movements) {
      for (const { kit, minLoadKg } of kitNeeded.flatMap(({ anyOf }) => anyOf)) {
        if (minLoadKg !== null) expect(loaded).toContain(kit);
      }
    }
    for (const { kit } of team.memberships) {
      for (const owned of kit) if (owned.loadsKg.length > 0) expect(loaded).toContain(owned.kit);
    }
  });

  it('never substitutes a movement by itself or by one that needs the missing kit', () => {
    const inPlans = linesOf(team).flatMap(({ movement, substitutions }) =>
      substitutions.map(({ movement: to, missing, missingKit }) => ({ from: movement, to, missing, missingKit })),
    );
    for (const { from, to, missing, missingKit } of [...team.substitutions, ...inPlans]) {
      expect(to).not.toBe(from);
      expect(missing === 'kit', `${from} → ${to}`).toBe(missingKit !== null);
      if (missingKit === null) continue;
      expect(kitOf(movementIn(team, from)), `${from} → ${to}`).toContain(missingKit);
      expect(kitOf(movementIn(team, to)), `${from} → ${to}`).not.toContain(missingKit);
    }
    expect(twice(team.substitutions.map(({ from, to }) => `${from} ${to}`))).toEqual([]);
    for (const { from, to } of team.substitutions) {
      expect(movementSlugs).toContain(from);
      expect(movementSlugs).toContain(to);
    }
  });

  it('has cautions where things are swung, hung from, jumped onto or leaned against', () => {
    const risky = new Set(['bar', 'rings', 'box', 'door', 'desk', 'rope', 'band']);
    for (const movement of team.movements) {
      const isRisky = movement.kitNeeded.some(({ anyOf }) => anyOf.every(({ kit }) => risky.has(kit)));
      if (isRisky) expect(movement.cautions, movement.name).not.toEqual([]);
    }
  });

  it('shows in each recording what the plan of its session has', () => {
    for (const { slug, blocks, recording } of team.sessions) {
      for (const chapter of recording?.script.chapters ?? []) {
        const where = `${slug}: ${chapter.title}`;
        if (chapter.kind === 'aside') {
          expect(chapter.block, where).toBeUndefined();
          continue;
        }
        const block = blocks.find((one) => one.slug === chapter.block);
        expect(block, where).toBeDefined();
        const lines = block?.lines ?? [];
        const shown = chapter.standsInFor ?? chapter.movement;
        if (shown)
          expect(
            lines.map(({ movement }) => movement),
            where,
          ).toContain(shown);
        expect(chapter.kind === 'substitution', where).toBe(chapter.standsInFor !== undefined);
        if (!chapter.standsInFor) continue;
        expect(chapter.missing === 'kit', where).toBe(chapter.missingKit !== undefined);
        const planned = lines.find(({ movement }) => movement === chapter.standsInFor)?.substitutions ?? [];
        expect(planned, where).toContainEqual(
          expect.objectContaining({
            movement: chapter.movement,
            missing: chapter.missing,
            missingKit: chapter.missingKit ?? null,
          }),
        );
      }
    }
  });

  it('writes chapters, cues and sentences that the product takes', () => {
    const id = demoId('any');
    for (const { script } of recordingsOf(team)) {
      for (const { title, kind, says } of script.chapters) {
        Chapter.parse({ id, startMs: 0, endMs: 1, kind, title });
        for (const said of says) {
          const sentence = typeof said === 'string' ? { text: said } : said;
          CaptionLine.parse({ startMs: 0, endMs: 1, text: sentence.text });
          if (sentence.cue) Cue.parse({ id, atMs: 0, ...sentence.cue });
        }
      }
    }
  });
});

it('has asides in two recordings, and every motion that can be drawn in some recording', () => {
  const scripts = recordingsOf(loft).map(({ script }) => script);
  expect(scripts.filter(({ chapters }) => chapters.some(({ kind }) => kind === 'aside'))).toHaveLength(2);
  const shown = scripts.flatMap(({ chapters }) =>
    chapters.flatMap(({ motion, says }) => [
      motion,
      ...says.flatMap((said) => (typeof said === 'string' ? [] : (said.motion ?? []))),
    ]),
  );
  expect(new Set(shown)).toEqual(new Set(motionNames));
});
