import type { Role } from '../../../shared/domain/words';

/** What each role is for, as the owner chooses one. */
export const roleWords = {
  owner: { name: 'Owner', does: 'runs the team: people, roles, everything else' },
  coach: { name: 'Coach', does: 'plans, films, marks and publishes sessions' },
  editor: { name: 'Editor', does: 'corrects captions, cues, chapters and the dictionary' },
  member: { name: 'Member', does: 'finds, watches and trains what is published' },
} as const satisfies Record<Role, { name: string; does: string }>;

export const roleOptions = (['member', 'editor', 'coach', 'owner'] as const).map((value) => ({
  value,
  label: roleWords[value].name,
}));
