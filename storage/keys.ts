/** Every object's name in the store. Names hold ids alone, never anything that a person typed. */

/** What a browser sent; no address is ever given out for these. */
export const originalKey = (teamId: string, recordingId: string, uploadId: string) =>
  `originals/${teamId}/${recordingId}/${uploadId}`;
export const originalsPrefix = (teamId: string, recordingId: string) => `originals/${teamId}/${recordingId}/`;

/** Something made that signed addresses may lead to; `ownerId` is a recording or a movement. */
export const madeKey = (teamId: string, ownerId: string, name: string) => `made/${teamId}/${ownerId}/${name}`;
export const madePrefix = (teamId: string, ownerId: string) => `made/${teamId}/${ownerId}/`;
