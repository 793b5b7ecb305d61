/**
 * What every playback file has in common: the index in front, so that it plays while it loads; and nothing of the camera's notes,
 * as those tell where somebody lives.
 */
export const playbackFile = [
  '-map_metadata',
  '-1',
  '-map_chapters',
  '-1',
  '-write_tmcd',
  '0',
  '-movflags',
  '+faststart',
  '-f',
  'mp4',
];
