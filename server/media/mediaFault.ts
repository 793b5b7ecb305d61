import { limits } from '../../shared/limits';

const hours = limits.recordingMs / 3_600_000;
const gigabytes = limits.recordingBytes / 1024 ** 3;

/** Why a recording can't be used, what the coach can do about it, and whether the same work is worth another try. */
const faults = {
  empty: {
    retry: false,
    message:
      'This file is empty. Check that the recording plays on the device it was filmed with, then upload it again.',
  },
  notVideo: {
    retry: false,
    message: 'This file is not a video. Choose the recording as the phone or camera saved it, usually MP4 or MOV.',
  },
  noPicture: {
    retry: false,
    message: 'This file has no moving picture, only sound or a still. Choose the video recording itself.',
  },
  truncated: {
    retry: false,
    message:
      'Part of this recording is missing. Check that it plays to its end on the device it was filmed with, then upload it again.',
  },
  tooLong: {
    retry: false,
    message: `This recording is longer than ${hours} hours. Cut it into shorter ones and upload each of them.`,
  },
  tooLarge: {
    retry: false,
    message: `This recording is larger than can be used: at most ${gigabytes} GB and a picture of 8192 × 4320. Save it as 1080p and upload that.`,
  },
  disguised: {
    retry: false,
    message: 'This file only points to other files and holds no recording. Upload the video file itself.',
  },
  unsupported: {
    retry: false,
    message:
      'This kind of video cannot be read here. Save it as MP4 (H.264) with the phone or an editor and upload that.',
  },
  tookTooLong: {
    retry: true,
    message:
      'Preparing this recording took too long and was stopped. Try again; if it stops again, save it as 1080p and upload that.',
  },
  lostWorker: {
    retry: true,
    message: 'The work on this recording was interrupted before it was done. Nothing is lost; try again.',
  },
} as const satisfies Record<string, { retry: boolean; message: string }>;

export type MediaFaultCode = keyof typeof faults;

/** A recording that can't be used as it is; `message` is for the coach, `detail` for the log alone. */
export class MediaFault extends Error {
  /** whether the same work may end well on another try */
  readonly retry: boolean;

  constructor(
    readonly code: MediaFaultCode,
    /** what the tool said, for the log */
    readonly detail = '',
  ) {
    super(faults[code].message);
    this.name = 'MediaFault';
    this.retry = faults[code].retry;
  }
}
