import type { DoseRule } from '../../../shared/domain/kit/doseRule';
import type { Caution } from '../../../shared/domain/training/caution';
import type { Dose } from '../../../shared/domain/training/dose';
import type { Scheme } from '../../../shared/domain/training/scheme';
import type { BlockKind, MissingThing, Pattern, Role, SessionState } from '../../../shared/domain/words';
import type { RecordingScript } from '../script';

/** The demo team as data: slugs stand in for ids, days from today for dates. */

export type DemoPerson = { slug: string; name: string; email: string };

export type DemoKitItem = {
  slug: string;
  name: string;
  otherNames: readonly string[];
  /** how its absence is said: "nothing to hang from" */
  withoutText: string;
  loadMatters: boolean;
};

export type DemoOwnedKit = { kit: string; count: number; loadsKg: readonly number[] };

export type DemoMembership = { person: string; role: Role; kit: readonly DemoOwnedKit[] };

export type DemoKitOption = { kit: string; count: number; minLoadKg: number | null };
export type DemoKitNeed = { anyOf: readonly DemoKitOption[] };

export type DemoMovement = {
  slug: string;
  name: string;
  otherNames: readonly string[];
  pattern: Pattern;
  kitNeeded: readonly DemoKitNeed[];
  points: readonly string[];
  faults: readonly string[];
  cautions: readonly Caution[];
};

export type DemoSubstitution = {
  from: string;
  to: string;
  missing: MissingThing;
  missingKit: string | null;
  doseRule: DoseRule;
  reason: string;
};

export type DemoLineSubstitution = {
  movement: string;
  missing: MissingThing;
  missingKit: string | null;
  dose: Dose;
  reason: string;
};

export type DemoLine = {
  movement: string;
  dose: Dose;
  note: string;
  substitutions: readonly DemoLineSubstitution[];
};

export type DemoBlock = {
  slug: string;
  kind: BlockKind;
  title: string;
  scheme: Scheme | null;
  note: string;
  lines: readonly DemoLine[];
};

export type DemoRecording = {
  slug: string;
  title: string;
  coach: string;
  fileName: string;
  script: RecordingScript;
};

export type DemoSession = {
  slug: string;
  /** from today, in the team's time zone */
  dayOffset: number;
  title: string;
  note: string;
  aim: string;
  coach: string;
  state: SessionState;
  blocks: readonly DemoBlock[];
  recording: DemoRecording | null;
};

export type DemoTeam = {
  slug: string;
  name: string;
  timeZone: string;
  kitItems: readonly DemoKitItem[];
  memberships: readonly DemoMembership[];
  movements: readonly DemoMovement[];
  substitutions: readonly DemoSubstitution[];
  sessions: readonly DemoSession[];
};
