import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { setTimeout as pause } from 'node:timers/promises';

export type Program = {
  name: string;
  /** arguments for Node: flags, the file, its own */
  args: string[];
  env: Record<string, string | undefined>;
  /** an open file that takes what it says, or the terminal */
  output: number | 'inherit';
  onMessage?: (message: unknown) => void;
  /** what it said last, shown when it ends unasked */
  lastWords?: () => string;
};

export type Supervised = {
  /** how often it ended unasked */
  readonly failures: number;
  /** Ends it and starts it anew, as after a change of its source. */
  restart(): Promise<void>;
  /** Ends it in order, and with all that it started when that takes longer than this. */
  stop(patienceMs: number): Promise<void>;
};

const backOff = { firstMs: 500, longestMs: 15_000, forgetAfterMs: 30_000 };

/** Starts a program in a process group of its own and starts it again whenever it ends unasked, after a growing pause. */
export function keepRunning(program: Program, say: (line: string) => void): Supervised {
  let state: 'running' | 'stopping' = 'running';
  let child = start(program);
  let delayMs = backOff.firstMs;
  let failures = 0;
  let startedAt = Date.now();
  const asked = new WeakSet<ChildProcess>();

  const watch = (watched: ChildProcess) => {
    watched.once('exit', async (code, signal) => {
      // what it started, ffmpeg for one, goes with it
      killGroup(watched, 'SIGKILL');
      if (state === 'stopping' || asked.has(watched)) return;
      if (Date.now() - startedAt > backOff.forgetAfterMs) delayMs = backOff.firstMs;
      failures++;
      say(
        `${program.name} ended (${signal ?? code}); it starts again in ${delayMs / 1000} s.${program.lastWords?.() ?? ''}`,
      );
      await pause(delayMs, undefined, { ref: true });
      delayMs = Math.min(delayMs * 2, backOff.longestMs);
      if (state === 'running' && child === watched) begin();
    });
  };
  const begin = () => {
    startedAt = Date.now();
    child = start(program);
    watch(child);
  };
  watch(child);

  const end = async (ending: ChildProcess, patienceMs: number) => {
    if (ending.exitCode !== null || ending.signalCode !== null || ending.pid === undefined) return;
    const gone = once(ending, 'exit');
    ending.kill('SIGTERM');
    const late = setTimeout(() => killGroup(ending, 'SIGKILL'), patienceMs);
    await gone;
    clearTimeout(late);
  };

  return {
    get failures() {
      return failures;
    },
    async restart() {
      const old = child;
      asked.add(old);
      await end(old, 3000);
      if (state === 'running' && child === old) begin();
    },
    async stop(patienceMs) {
      state = 'stopping';
      await end(child, patienceMs);
    },
  };
}

function start({ args, env, output, onMessage, name }: Program): ChildProcess {
  const child = spawn(process.execPath, args, {
    env,
    // Ctrl-C in the terminal reaches the launcher alone, which then ends all in order
    detached: true,
    stdio: ['ignore', output, output, 'ipc'],
  });
  if (onMessage) child.on('message', onMessage);
  child.on('error', (error) => console.error(`${name}: ${error.message}`));
  return child;
}

function killGroup({ pid }: ChildProcess, signal: NodeJS.Signals) {
  if (pid === undefined) return;
  try {
    process.kill(-pid, signal);
  } catch {
    // nobody of the group is left
  }
}
