import { limits } from '../../../shared/limits';
import { formatBytes } from '../../lib/format';

/** Endings of the containers that phones, cameras and editing programs write; the server takes the same. */
const endings = ['mp4', 'm4v', 'mov', 'qt', 'webm', 'mkv', 'avi', 'ts', 'mts', 'm2ts', '3gp', '3g2'] as const;

/** For the device's own picker: systems that know no type for an ending still show the file. */
export const acceptedFiles = ['video/*', ...endings.map((ending) => `.${ending}`)].join(',');

type PickedFile = Pick<File, 'name' | 'size' | 'type'>;

/** What can be told before the first byte is sent: why a file is not taken, in a sentence, or null. */
export function fileFault({ name, size, type }: PickedFile): string | null {
  const ending = /\.([a-z0-9]{1,8})$/i.exec(name)?.[1]?.toLowerCase();
  const isVideo = type.startsWith('video/') || (ending !== undefined && isUnknown(type));
  if (!isVideo || (ending !== undefined && !isAccepted(ending)))
    return 'This is not a video file that can be used here. Choose the recording as MP4, MOV, WebM or MKV.';
  if (size === 0) return 'This file is empty. Check that it plays on the device it was filmed with.';
  if (size > limits.recordingBytes)
    return `This file has ${formatBytes(size)}; at most ${formatBytes(limits.recordingBytes)} fit. Save it as 1080p or cut it in two.`;
  return null;
}

/** Browsers that don't know an ending announce nothing, or just bytes. */
const isUnknown = (type: string) => type === '' || type === 'application/octet-stream';

const isAccepted = (ending: string) => (endings as readonly string[]).includes(ending);
