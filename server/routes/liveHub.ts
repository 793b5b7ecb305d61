import type { Response } from 'express';
import pg from 'pg';
import { LiveEvent } from '../../shared/contracts/live';
import type { Log } from '../middleware/log';
import { liveChannel } from '../services/live';

/** How often an open stream says that it is still there; balancers close what is silent for a minute. */
const heartbeatMs = 20_000;

/** A page opens its stream anew after so long, and is asked again who it belongs to. */
const streamMs = 5 * 60_000;

/** Hands what PostgreSQL notifies to the pages of this process: any web process can serve any listener. */
export class LiveHub {
  private readonly streams = new Map<string, Set<Response>>();
  private client: pg.Client | undefined;
  private readonly heartbeat: NodeJS.Timeout;
  private closed = false;

  constructor(
    private readonly databaseUrl: string,
    private readonly log: Log,
  ) {
    this.heartbeat = setInterval(() => this.each((stream) => write(stream, ': here\n\n')), heartbeatMs);
    this.heartbeat.unref();
  }

  async listen(): Promise<void> {
    const client = new pg.Client({ connectionString: this.databaseUrl, keepAlive: true });
    client.on('notification', ({ payload }) => this.pass(payload ?? ''));
    client.on('error', (error) => this.log.warn({ err: error }, 'live connection lost'));
    client.on('end', () => this.listenAgain());
    // what was told in between is lost: pages open anew and ask for what they show
    client.on('end', () => this.each((stream) => stream.end()));
    this.client = client;
    try {
      await client.connect();
      await client.query(`listen ${liveChannel}`);
    } catch (error) {
      this.log.warn({ err: error }, 'live connection not made');
      client.end().catch(() => this.listenAgain());
    }
  }

  /** Opens a team's stream on an answer. */
  add(teamId: string, res: Response): void {
    res.writeHead(200, {
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'no-store, no-transform',
      'X-Accel-Buffering': 'no',
    });
    res.write('retry: 2000\n\n');
    const team = this.streams.get(teamId) ?? new Set();
    this.streams.set(teamId, team.add(res));
    const end = setTimeout(() => res.end(), streamMs);
    end.unref();
    res.on('close', () => {
      clearTimeout(end);
      team.delete(res);
      if (team.size === 0) this.streams.delete(teamId);
    });
  }

  async close(): Promise<void> {
    this.closed = true;
    clearInterval(this.heartbeat);
    this.each((stream) => stream.end());
    await this.client?.end().catch(() => undefined);
  }

  private listenAgain(): void {
    if (this.closed) return;
    setTimeout(() => this.closed || void this.listen(), 1000).unref();
  }

  private pass(payload: string): void {
    const read = parsePayload(payload);
    if (!read) return;
    for (const stream of this.streams.get(read.teamId) ?? []) write(stream, `data: ${JSON.stringify(read.event)}\n\n`);
  }

  private each(task: (stream: Response) => void): void {
    for (const team of this.streams.values()) for (const stream of team) task(stream);
  }
}

/** A stream that has ended is still listed until its connection closes. */
function write(stream: Response, text: string): void {
  if (!stream.writableEnded) stream.write(text);
}

function parsePayload(payload: string): { teamId: string; event: LiveEvent } | null {
  try {
    const { teamId, event } = JSON.parse(payload) as { teamId: string; event: unknown };
    return { teamId, event: LiveEvent.parse(event) };
  } catch {
    return null;
  }
}
