import { z } from 'zod';

/** What `probeRecording` asks ffprobe for; every name is one of its own. */
export const describeRecording = [
  '-show_entries',
  [
    'format=format_name,duration',
    'format_tags=creation_time,com.apple.quicktime.creationdate',
    'stream=index,codec_type,codec_name,profile,width,height,sample_aspect_ratio,pix_fmt,field_order,r_frame_rate,avg_frame_rate,duration,bit_rate,channels',
    'stream_tags=DURATION,rotate',
    'stream_side_data=rotation',
    'stream_disposition=attached_pic',
  ].join(':'),
  '-of',
  'json',
];

const Stream = z.object({
  index: z.int(),
  codec_type: z.string().optional(),
  codec_name: z.string().optional(),
  profile: z.string().optional(),
  width: z.number().optional(),
  height: z.number().optional(),
  sample_aspect_ratio: z.string().optional(),
  pix_fmt: z.string().optional(),
  field_order: z.string().optional(),
  r_frame_rate: z.string().optional(),
  avg_frame_rate: z.string().optional(),
  duration: z.string().optional(),
  channels: z.number().optional(),
  tags: z.record(z.string(), z.string()).optional(),
  side_data_list: z.array(z.object({ rotation: z.number().optional() })).optional(),
  disposition: z.object({ attached_pic: z.number().optional() }).optional(),
});
export type Stream = z.infer<typeof Stream>;

const Description = z.object({
  streams: z.array(Stream).default([]),
  format: z
    .object({
      format_name: z.string().default(''),
      duration: z.string().optional(),
      tags: z.record(z.string(), z.string()).optional(),
    })
    .default({ format_name: '' }),
});
export type Description = z.infer<typeof Description>;

/** @returns what ffprobe printed, or undefined where it printed nothing of use */
export function parseDescription(json: string): Description | undefined {
  try {
    return Description.safeParse(JSON.parse(json)).data;
  } catch {
    return undefined;
  }
}

/** Length of a stream in ms, or null where the container doesn't tell; Matroska keeps it in a tag. */
export function lengthOf(stream: Stream): number | null {
  const seconds = Number(stream.duration ?? Number.NaN);
  if (Number.isFinite(seconds) && seconds > 0) return Math.round(seconds * 1000);
  const tag = /^(\d+):(\d\d):([\d.]+)$/.exec(stream.tags?.DURATION ?? '');
  const ms = tag ? Math.round((Number(tag[1]) * 3600 + Number(tag[2]) * 60 + Number(tag[3])) * 1000) : 0;
  return ms > 0 ? ms : null;
}

/** Degrees clockwise by which a player turns the stored picture: 0, 90, 180 or 270. ffprobe counts the other way round. */
export function rotationOf(stream: Stream): 0 | 90 | 180 | 270 {
  const told = stream.side_data_list?.find((data) => data.rotation !== undefined)?.rotation;
  const clockwise = told === undefined ? Number(stream.tags?.rotate ?? 0) : -told;
  const quarters = ((Math.round(clockwise / 90) % 4) + 4) % 4;
  return quarters === 1 ? 90 : quarters === 2 ? 180 : quarters === 3 ? 270 : 0;
}

/** Width and height as shown: square pixels, turned upright. */
export function shownSize(stream: Stream): { width: number; height: number } {
  const [across = 1, down = 1] = (stream.sample_aspect_ratio ?? '').split(':').map(Number);
  const stretch = across > 0 && down > 0 ? across / down : 1;
  const width = Math.round((stream.width ?? 0) * stretch);
  const height = stream.height ?? 0;
  return rotationOf(stream) % 180 === 0 ? { width, height } : { width: height, height: width };
}

/** A rate as ffprobe writes it, `30000/1001`, or null for `0/0`. */
export function rateOf(written: string | undefined): number | null {
  const [over = 0, under = 1] = (written ?? '').split('/').map(Number);
  const rate = over / under;
  return Number.isFinite(rate) && rate > 0 ? rate : null;
}

/**
 * When the camera says it filmed, as an instant, or null. A phone's own tag comes first: others are rewritten by every export.
 * Clocks that were never set read 1904 or 1970.
 */
export function recordedAt(tags: Record<string, string> | undefined): string | null {
  const told = tags?.['com.apple.quicktime.creationdate'] ?? tags?.creation_time;
  const instant = told === undefined ? Number.NaN : Date.parse(told);
  if (Number.isNaN(instant) || instant < Date.UTC(2000, 0, 1) || instant > Date.now() + 86_400_000) return null;
  return new Date(instant).toISOString();
}
