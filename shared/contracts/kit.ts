import { z } from 'zod';
import { OwnedKit } from '../domain/kit/kit';
import { Id, shortText, Version } from '../domain/values';
import { endpoint } from './endpoint';

export const KitItem = z.object({
  id: Id,
  name: z.string(),
  otherNames: z.array(z.string()),
  /** how its absence is said: "nothing to hang from" */
  withoutText: z.string(),
  loadMatters: z.boolean(),
  version: Version,
});
export type KitItem = z.infer<typeof KitItem>;

const KitItemChange = z.object({
  name: shortText(60),
  otherNames: z.array(shortText(60)).max(20).default([]),
  withoutText: shortText(80),
  loadMatters: z.boolean().default(false),
});

export const listKit = endpoint({
  method: 'get',
  path: '/teams/:team/kit',
  may: 'readLibrary',
  summary: 'The kit that the team’s movements ask for',
  response: z.object({ items: z.array(KitItem) }),
});

export const addKitItem = endpoint({
  method: 'post',
  path: '/teams/:team/kit',
  may: 'editKit',
  summary: 'Add a kit item',
  body: KitItemChange,
  response: KitItem,
  status: 201,
  errors: ['nameTaken'],
});

export const updateKitItem = endpoint({
  method: 'put',
  path: '/teams/:team/kit/:kitItemId',
  may: 'editKit',
  summary: 'Change a kit item',
  body: KitItemChange.extend({ version: Version }),
  response: KitItem,
  errors: ['nameTaken', 'stale'],
});

export const getMyKit = endpoint({
  method: 'get',
  path: '/teams/:team/my-kit',
  may: 'keepOwn',
  summary: 'What the person who asks owns',
  response: z.object({ items: z.array(OwnedKit) }),
});

export const saveMyKit = endpoint({
  method: 'put',
  path: '/teams/:team/my-kit',
  may: 'keepOwn',
  summary: 'Say what one owns',
  body: z.object({ items: z.array(OwnedKit).max(100) }),
  response: getMyKit.response,
  errors: ['invalid'],
});
