import { type Role, roles } from './words';

/** Who may do what: asked by the services to refuse and by the client to hide. */
export const permissions = {
  /** published sessions, their recordings, the dictionary, search */
  readLibrary: ['owner', 'coach', 'editor', 'member'],
  /** a member's own kit, place in a recording, notices */
  keepOwn: ['owner', 'coach', 'editor', 'member'],
  /** drafts, asides, recordings that nobody published, progress of making */
  readDrafts: ['owner', 'coach', 'editor'],
  editPlan: ['owner', 'coach'],
  publish: ['owner', 'coach'],
  uploadFootage: ['owner', 'coach', 'editor'],
  removeFootage: ['owner', 'coach'],
  editChapters: ['owner', 'coach', 'editor'],
  editWords: ['owner', 'coach', 'editor'],
  editMovement: ['owner', 'coach', 'editor'],
  editKit: ['owner', 'coach'],
  managePeople: ['owner'],
  editTeam: ['owner'],
  readAudit: ['owner'],
} as const satisfies Record<string, readonly Role[]>;

export type Action = keyof typeof permissions;

export const actions = Object.keys(permissions) as Action[];

/** Whether a role may do something. */
export function may(role: Role, action: Action): boolean {
  return (permissions[action] as readonly Role[]).includes(role);
}

/** The table turned round, for screens that explain a role. */
export function actionsOf(role: Role): Action[] {
  return actions.filter((action) => may(role, action));
}

export const everyRole = roles;
