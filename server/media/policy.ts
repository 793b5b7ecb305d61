import { limits } from '../../shared/limits';

/**
 * The one safety policy for every file that somebody sent: each run of ffprobe and ffmpeg goes through it.
 * Footage is hostile until it has been read: a file may name other files, claim absurd sizes or never end.
 */

const MB = 1024 * 1024;
const MINUTE = 60_000;

/** What a run of ffmpeg or ffprobe may use, enforced by the kernel (`prlimit`). */
export type RunLimits = {
  /** address space; 1080p needs 768 MB, 4K in HEVC with 10 bits 1 GB (measured) */
  addressBytes: number;
  /** processor time of all threads together; ends what no longer hears a signal */
  cpuSeconds: number;
  /** the largest file that may be written; zero would kill a run whose messages go to a file */
  fileBytes: number;
};

export const policy = {
  /** containers that phones, cameras and editing programs write; none of them can name another file */
  demuxers: 'mov,matroska,mpegts,avi',
  /** nothing is ever fetched */
  protocols: 'file,pipe,fd',
  /** largest single allocation: a picture of `maxPixels` in 10 bits fits */
  maxAllocBytes: 256 * MB,
  /** 8192 × 4320, the largest picture of a camera */
  maxPixels: 8192 * 4320,
  /** below this a picture shows nothing, and the encoder's own blocks are 16 wide */
  minSide: 16,
  /** a picture more than this many times wider than high is not footage */
  maxAspect: 16,
  /** phones write up to eight: picture, sound, spatial sound, several of measurements */
  maxStreams: 16,
  /** how far is read to learn what is inside: a camera's long first picture group fits */
  probeBytes: 20 * MB,
  probeSpanMicroseconds: 20_000_000,
  /** fewer pictures a second than this are a slide show with gaps of minutes, which no player seeks */
  minFps: 1,
  longestMs: limits.recordingMs,
  largestBytes: limits.recordingBytes,
  /** decoder and encoder threads of a run; the worker shares its machine */
  threads: 2,
  /** open files of a run; a batch of thumbnails opens fewer than 40 */
  openFiles: 128,
  /** a probe takes a second; half a minute is a busy disk */
  probeDeadlineMs: 30_000,
  /** one picture needs the seek and at most a few seconds of decoding */
  pictureDeadlineMs: 2 * MINUTE,
} as const;

export const probeLimits: RunLimits = { addressBytes: 1024 * MB, cpuSeconds: 20, fileBytes: MB };

export const pictureLimits: RunLimits = { addressBytes: 2048 * MB, cpuSeconds: 120, fileBytes: 32 * MB };

/** 1080p costs 0.6 of its length in processor time, 4K about 3; double that on a slow machine. */
export const makingDeadlineMs = (durationMs: number) => 5 * MINUTE + 6 * durationMs;

export const makingLimits = (durationMs: number): RunLimits => ({
  addressBytes: 3072 * MB,
  cpuSeconds: Math.ceil((policy.threads * makingDeadlineMs(durationMs)) / 1000),
  // a copy is as large as what was uploaded, plus its new index
  fileBytes: policy.largestBytes + 256 * MB,
});

/** The limits as `prlimit` takes them; nothing is dumped when a run dies. */
export const prlimitArguments = (run: RunLimits) => [
  `--as=${run.addressBytes}`,
  `--cpu=${run.cpuSeconds}`,
  `--fsize=${run.fileBytes}`,
  `--nofile=${policy.openFiles}`,
  '--core=0',
];

/** What stands before every `-i`, of ffprobe and ffmpeg alike. */
export const inputSafety = [
  '-protocol_whitelist',
  policy.protocols,
  '-format_whitelist',
  policy.demuxers,
  '-max_alloc',
  String(policy.maxAllocBytes),
  '-max_pixels',
  String(policy.maxPixels),
  '-max_streams',
  String(policy.maxStreams),
];

/** A path that can't be taken for an address or an option. */
export const inputAddress = (absolutePath: string) => `file:${absolutePath}`;
