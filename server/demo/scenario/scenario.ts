import { kitItems } from './kit';
import { lunchCrew } from './lunchCrew';
import { memberships } from './memberships';
import { movements } from './movements';
import { sessions } from './sessions';
import type { DemoTeam } from './shapes';
import { substitutions } from './substitutions';

/** The Apple Loft trains above an old cider press in Nether Wenlow. Its people, its places and itself are invented. */
const appleLoft: DemoTeam = {
  slug: 'apple-loft',
  name: 'Apple Loft',
  timeZone: 'Europe/London',
  kitItems,
  memberships,
  movements,
  substitutions,
  sessions,
};

export const demoTeams: readonly DemoTeam[] = [appleLoft, lunchCrew];
