/** Numbers with a meaning, each with its unit and its reason. */

const KB = 1024;
const MB = 1024 * KB;
const GB = 1024 * MB;

export const limits = {
  /** what one JSON request may carry: 3,000 caption lines with room to spare */
  jsonBytes: 2 * MB,
  /** a caption file of a two-hour talk is below 300 kB */
  captionFileBytes: 2 * MB,
  /** a phone's photograph */
  pictureBytes: 12 * MB,
  /** two hours of 1080p from a phone */
  recordingBytes: 8 * GB,
  /** the smallest part: S3 asks for 5 MB, 16 MB keeps requests few and a retry short */
  uploadPartBytes: 16 * MB,
  /** S3's own limit */
  uploadParts: 10_000,
  partsAtOnce: 4,
  /** longest recording taken */
  recordingMs: 4 * 60 * 60 * 1000,
  chaptersPerRecording: 500,
  captionLinesPerRecording: 6000,
  cuesPerRecording: 1000,
  blocksPerSession: 20,
  linesPerBlock: 30,
  substitutionsPerLine: 6,
  movementsPerTeam: 5000,
  pageSize: 50,
  pageSizeMax: 100,
  /** NIST SP 800-63B-4 (second-hand): 15 when a password is the only factor */
  passwordMin: 15,
  /** ASVS 5.0 6.2.9: at least 64 are accepted; bounded so that hashing is never fed megabytes */
  passwordMax: 256,
  /** an invitation waits over a weekend */
  inviteHours: 7 * 24,
  resetMinutes: 60,
  /** a sign-in ends after this long without a request, and at the latest after `sessionMaxDays` */
  sessionIdleDays: 14,
  sessionMaxDays: 60,
  /** media addresses are rounded to this, so that a browser may keep what it has */
  mediaAddressRoundMs: 10 * 60 * 1000,
  mediaAddressMs: 60 * 60 * 1000,
  /** exact counts stop here and are shown as "1000+" */
  countCap: 1000,
} as const;
