import { randomBytes } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { makePlayback } from '../../server/media/makePlayback';
import { MediaFault, type MediaFaultCode } from '../../server/media/mediaFault';
import { probeRecording } from '../../server/media/probe';
import { faultOf } from '../../server/media/runFfmpeg';
import { aac, clip, clipFolder, drawn, fileOf, h264, phoneClip, played, removeClips } from '../support/clips';

afterAll(removeClips);

const indexLast = () => clip('indexLast.mp4', [...drawn('640x360', 4), ...played(4), ...h264(), ...aac]);

const part = async (name: string, of: string, share: number) => {
  const whole = await readFile(of);
  return fileOf(name, whole.subarray(0, Math.floor(whole.length * share)));
};

/** Where a top-level box starts. */
const boxAt = (file: Buffer, type: string) => file.indexOf(type, 0, 'latin1') - 4;

const coverOnly = async (name: string, codec: string) =>
  clip(name, [
    ...played(2),
    '-f',
    'lavfi',
    '-i',
    'color=red:size=64x64:rate=1:duration=1',
    '-map',
    '0:a',
    '-map',
    '1:v',
    '-frames:v',
    '1',
    '-c:a',
    codec,
    '-c:v',
    'mjpeg',
    '-disposition:v:0',
    'attached_pic',
  ]);

const shelf: [string, MediaFaultCode, () => Promise<string>][] = [
  ['an empty file', 'empty', () => fileOf('empty.mp4', '')],
  ['a text', 'notVideo', () => fileOf('text.mp4', 'Tomorrow: step-ups and rows.\n'.repeat(50))],
  ['noise', 'notVideo', () => fileOf('noise.mp4', randomBytes(200_000))],
  ['nothing but zeros', 'notVideo', () => fileOf('zeros.mp4', new Uint8Array(100_000))],
  ['a document', 'notVideo', () => fileOf('plan.mp4', Buffer.concat([Buffer.from('%PDF-1.7\n'), randomBytes(5000)]))],
  ['a playlist', 'disguised', () => fileOf('list.mp4', '#EXTM3U\n#EXTINF:4,\nfile:///etc/passwd\n#EXT-X-ENDLIST\n')],
  [
    'a playlist with a zero byte',
    'unsupported',
    () =>
      fileOf('zeroList.mp4', '#EXTM3U\n#EXT-X-TARGETDURATION:4\n#\0\n#EXTINF:4,\nfile:///etc/passwd\n#EXT-X-ENDLIST\n'),
  ],
  ['a concat script', 'disguised', () => fileOf('concat.mp4', "ffconcat version 1.0\nfile '/etc/passwd'\n")],
  [
    'a vector picture',
    'disguised',
    () => fileOf('vector.mp4', '<svg xmlns="http://www.w3.org/2000/svg"><image href="file:///etc/passwd"/></svg>'),
  ],
  [
    'a DASH description',
    'disguised',
    () => fileOf('dash.mp4', '<?xml version="1.0"?><MPD><BaseURL>http://127.0.0.1:9/</BaseURL></MPD>'),
  ],
  ['a song with a cover', 'noPicture', () => coverOnly('song.mp3', 'libmp3lame')],
  ['sound with a cover in MP4', 'noPicture', () => coverOnly('song.m4a', 'aac')],
  ['a sound without any picture', 'noPicture', () => clip('sound.mp4', [...played(2), ...aac])],
  ['a photograph', 'noPicture', () => clip('photo.jpg', [...drawn('64x64', 1), '-frames:v', '1'])],
  ['a container of another kind', 'unsupported', () => clip('old.flv', [...drawn('64x64', 1), '-c:v', 'flv'])],
  [
    'a recording that lost its end, index in front',
    'truncated',
    async () => part('cutFront.mp4', await phoneClip(), 0.6),
  ],
  ['a recording that lost its end and its index', 'truncated', async () => part('cutLast.mp4', await indexLast(), 0.6)],
  [
    'a picture of 36 million pixels',
    'tooLarge',
    () =>
      clip('wall.mkv', [
        '-f',
        'lavfi',
        '-i',
        'color=size=6100x6000:rate=2:duration=1',
        '-frames:v',
        '1',
        '-c:v',
        'mpeg4',
        '-threads',
        '1',
      ]),
  ],
  ['a picture of 8 pixels', 'unsupported', () => clip('dot.mkv', [...drawn('8x8', 1), '-c:v', 'mpeg4'])],
  ['a picture each ten seconds', 'unsupported', () => clip('slides.mp4', [...drawn('64x64', 60, '1/10'), ...h264()])],
  ['five hours', 'tooLong', () => clip('long.mp4', [...drawn('32x32', 18_000, '1'), ...h264(250)])],
];

describe('the hostile shelf', { timeout: 60_000 }, () => {
  it.each(shelf)('%s is refused as %s', async (_what, code, make) => {
    const fault = await probeRecording(await make()).catch((error: unknown) => error);
    expect(fault).toBeInstanceOf(MediaFault);
    expect(fault).toMatchObject({ code, retry: false });
    // a sentence for a coach: what it is and what to do, nothing of the tools
    expect((fault as MediaFault).message).toMatch(/^[A-Z].+\. .+\.$|: .+\.$/);
    expect((fault as MediaFault).message).not.toMatch(/ffmpeg|ffprobe|codec|moov/i);
  });

  it('notices an MP4 whose boxes fit but whose pictures stop early', async () => {
    const whole = await readFile(await phoneClip());
    const cut = Buffer.from(whole.subarray(0, Math.floor(whole.length * 0.6)));
    const mdat = boxAt(cut, 'mdat');
    cut.writeUInt32BE(cut.length - mdat, mdat);
    await refusedWhenMade(await fileOf('fits.mp4', cut));
  });

  it('notices a Matroska file that stops early', async () => {
    const whole = await clip('whole.mkv', [...drawn('320x180', 5), '-c:v', 'mpeg4']);
    await refusedWhenMade(await part('cut.mkv', whole, 0.5));
  });

  async function refusedWhenMade(input: string) {
    const output = join(clipFolder(), 'refused.mp4');
    const probed = await probeRecording(input);
    await expect(makePlayback({ input, output, probed })).rejects.toMatchObject({ code: 'truncated' });
    await expect(readFile(output)).rejects.toMatchObject({ code: 'ENOENT' });
  }
});

describe('what a failed run means', () => {
  it.each([
    ['ffmpeg was killed with signal SIGKILL', '', 'lostWorker', true],
    ['ffmpeg was killed with signal SIGXCPU', '', 'tookTooLong', true],
    ['ffmpeg was killed with signal SIGXFSZ', '', 'tooLarge', false],
    ['ffmpeg exited with code 1', 'av_interleaved_write_frame(): No space left on device', 'lostWorker', true],
    ['ffmpeg exited with code 1', 'moov atom not found', 'truncated', false],
    ['ffmpeg exited with code 1', 'Decoder (codec none) not found', 'unsupported', false],
  ] as const)('%s %s', (ended, tail, code, retry) => {
    expect(faultOf(ended, tail)).toMatchObject({ code, retry });
  });

  it('is no fault of the recording when ffmpeg is not there', () => {
    expect(faultOf('ffmpeg exited with code 127', 'prlimit: failed to execute ffmpeg')).not.toBeInstanceOf(MediaFault);
  });
});
