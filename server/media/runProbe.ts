import { spawn } from 'node:child_process';
import { MediaFault } from './mediaFault';
import { inputAddress, inputSafety, policy, prlimitArguments, probeLimits } from './policy';

/** A description is a few kB; a list of two minutes of packets below 1 MB. */
const mostOutput = 8 * 1024 * 1024;
const mostMessages = 16 * 1024;

export type ProbeRun = {
  /** 0 when ffprobe could open the file */
  exit: number;
  stdout: string;
  /** ffprobe's complaints, shortened */
  stderr: string;
};

/**
 * Runs ffprobe on one file under the policy.
 * @param path absolute
 * @param onText takes what is printed as it comes, where that is too much to keep; `stdout` is empty then
 * @param asked what to show, e.g. `['-show_entries', 'format=duration', '-of', 'json']`
 * @throws MediaFault `tookTooLong` past the deadline, `lostWorker` when it was killed; the signal's reason on abort
 */
export function runProbe(
  path: string,
  asked: readonly string[],
  signal?: AbortSignal,
  onText?: (text: string) => void,
): Promise<ProbeRun> {
  return new Promise((resolve, reject) => {
    if (signal?.aborted) return reject(signal.reason);
    const child = spawn(
      'prlimit',
      [...prlimitArguments(probeLimits), '--', 'ffprobe', ...probeArguments(path, asked)],
      { stdio: ['ignore', 'pipe', 'pipe'] },
    );
    let stdout = '';
    let tooMuch = false;
    let stderr = '';
    let late = false;

    const stop = () => child.kill('SIGKILL');
    const deadline = setTimeout(() => {
      late = true;
      stop();
    }, policy.probeDeadlineMs);
    signal?.addEventListener('abort', stop, { once: true });

    child.stdout.setEncoding('utf8').on('data', (text: string) => {
      if (onText) return onText(text);
      stdout += text;
      if (stdout.length <= mostOutput) return;
      tooMuch = true;
      stop();
    });
    child.stderr.setEncoding('utf8').on('data', (text: string) => {
      if (stderr.length < mostMessages) stderr += text;
    });

    const settle = (then: () => void) => {
      clearTimeout(deadline);
      signal?.removeEventListener('abort', stop);
      then();
    };
    child.once('error', (error) => settle(() => reject(error)));
    child.once('close', (exit, killedBy) =>
      settle(() => {
        if (signal?.aborted) reject(signal.reason);
        else if (late || killedBy === 'SIGXCPU') reject(new MediaFault('tookTooLong', stderr));
        else if (tooMuch) reject(new MediaFault('unsupported', 'ffprobe did not stop describing the file'));
        else if (exit === null) reject(new MediaFault('lostWorker', `ffprobe was killed by ${killedBy}`));
        // 126 and 127: prlimit found no ffprobe; a fault of the machine, not of the file
        else if (exit === 126 || exit === 127) reject(new Error(`ffprobe cannot be started: ${stderr}`));
        else resolve({ exit, stdout, stderr });
      }),
    );
  });
}

const probeArguments = (path: string, asked: readonly string[]) => [
  '-hide_banner',
  '-v',
  'error',
  ...inputSafety,
  '-probesize',
  String(policy.probeBytes),
  '-analyzeduration',
  String(policy.probeSpanMicroseconds),
  '-threads',
  '1',
  ...asked,
  '-i',
  inputAddress(path),
];
