import { canRedo, canUndo, type History, redo, startHistory, takeStep, undo } from '../../shared/domain/history';
import { ApiError } from './api';
import type { Draft, DraftPlace } from './drafts';

/** A document as the server has it. */
export type Saved<T> = { version: number; content: T };

export type SaveState<T> =
  | { is: 'saved' }
  /** changed a moment ago; saved as soon as the writing pauses */
  | { is: 'waiting' }
  | { is: 'saving' }
  /** nothing is sent until what is wrong was put right */
  | { is: 'refused'; reason: string }
  | { is: 'failed'; reason: string }
  /** somebody else saved meanwhile: nothing is sent until somebody decides */
  | { is: 'stale'; theirs: Saved<T> };

export type DocumentSnapshot<T> = {
  content: T;
  /** what the server had last, the ground that the changes stand on */
  base: Saved<T>;
  save: SaveState<T>;
  canUndo: boolean;
  canRedo: boolean;
  /** changes that an earlier visit did not get saved */
  left: Draft<T> | null;
};

export type DocumentSource<T> = {
  /** @throws ApiError */
  save(version: number, content: T): Promise<Saved<T>>;
  /** the server's current state out of a `stale` refusal; null when it cannot be read */
  readCurrent(current: unknown): Saved<T> | null;
  /** why it cannot be saved as it is, or null */
  faultOf(content: T): string | null;
  drafts: DraftPlace<T>;
};

/** A pause in the writing after which it is saved. */
export const saveAfterMs = 1000;
/** … and a copy is kept in the browser. */
const draftAfterMs = 300;
/** Changes of one kind in quick succession (letters, nudges) are one step of undo. */
const oneStepMs = 2000;
/** Tries after a lost connection, then by the button or when the browser is online again. */
const againAfterMs = [3000, 10_000, 30_000] as const;
const passing = new Set(['offline', 'broken', 'unavailable', 'tooOften']);

/**
 * A document that is edited whole and saved by itself: undo and redo, one save at a time, a copy in the browser until it is
 * saved, and a stop when somebody else saved a newer version. Nothing that was written is ever thrown away unasked.
 */
export class KeptDocument<T> {
  private history: History<T>;
  private base: Saved<T>;
  /** the version at the ground in the server's own writing, which may differ from what was sent */
  private answered: T;
  private save: SaveState<T> = { is: 'saved' };
  private left: Draft<T> | null = null;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private draftTimer: ReturnType<typeof setTimeout> | undefined;
  private sending: Promise<boolean> | null = null;
  private tries = 0;
  private lastStep: { group: string; at: number } | null = null;
  private snapshot: DocumentSnapshot<T>;
  private readonly listeners = new Set<() => void>();
  /** when it was last changed, undone or redone; of two documents on a page the key for undo means the later one */
  touchedAt = 0;

  constructor(
    saved: Saved<T>,
    private readonly source: DocumentSource<T>,
  ) {
    this.base = saved;
    this.answered = saved.content;
    this.history = startHistory(saved.content);
    const left = source.drafts.read();
    if (left && !isAlike(left.content, saved.content)) this.left = left;
    else if (left) source.drafts.remove();
    this.snapshot = this.picture();
  }

  subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  current = (): DocumentSnapshot<T> => this.snapshot;

  isUnsaved(): boolean {
    return this.history.present !== this.base.content;
  }

  /** Takes a change as a step. @param group changes of the same group in quick succession become one step */
  change(next: T, group?: string): void {
    if (next === this.history.present) return;
    const now = Date.now();
    const goesOn = group !== undefined && this.lastStep?.group === group && now - this.lastStep.at < oneStepMs;
    this.history = goesOn ? { ...this.history, present: next, future: [] } : takeStep(this.history, next);
    this.lastStep = group === undefined ? null : { group, at: now };
    this.touched();
  }

  undo(): void {
    this.step(undo(this.history));
  }

  redo(): void {
    this.step(redo(this.history));
  }

  /** Saves now. @returns whether everything is saved */
  async flush(): Promise<boolean> {
    clearTimeout(this.timer);
    while (this.isUnsaved() && this.save.is !== 'stale') if (!(await this.send())) return false;
    return !this.isUnsaved();
  }

  /** What the server has now. It is shown at once when nothing is unsaved here; else the next save finds out. @returns whether a newer version is shown now */
  offer(saved: Saved<T>): boolean {
    if (saved.version < this.base.version || this.isUnsaved() || this.sending) return false;
    // the server may change a version's links, when what they led to is gone
    if (saved.version === this.base.version && isAlike(saved.content, this.answered)) return false;
    const isNewer = saved.version > this.base.version;
    this.base = saved;
    this.answered = saved.content;
    this.history = startHistory(saved.content);
    this.lastStep = null;
    if (this.left && isAlike(this.left.content, saved.content)) {
      // what was left had reached the server after all, as the page was closed
      this.left = null;
      this.source.drafts.remove();
    }
    this.report({ is: 'saved' });
    return isNewer;
  }

  /** A version that the server made itself, from a file or an earlier version; undo goes back behind it. */
  adopt(saved: Saved<T>): void {
    clearTimeout(this.timer);
    this.base = saved;
    this.answered = saved.content;
    this.history = takeStep(this.history, saved.content);
    this.lastStep = null;
    this.touchedAt = Date.now();
    this.keepDraft();
    this.report({ is: 'saved' });
  }

  /** The way out of `stale`: their version, mine over theirs, or both together. */
  decide(choice: 'theirs' | 'mine' | { both: T }): void {
    if (this.save.is !== 'stale') return;
    const { theirs } = this.save;
    if (choice === 'theirs') {
      this.adopt(theirs);
      return;
    }
    this.base = theirs;
    if (choice !== 'mine') this.history = takeStep(this.history, choice.both);
    this.touched();
    void this.flush();
  }

  /** What an earlier visit left unsaved is taken up, on the version that it was written on, or dropped. */
  takeUp(choice: 'take' | 'drop'): void {
    const { left } = this;
    if (!left) return;
    this.left = null;
    if (choice === 'drop') {
      this.source.drafts.remove();
      this.report(this.save);
      return;
    }
    // written on an older version: the save is then refused as stale, and both versions are shown
    if (left.version !== this.base.version) this.base = { version: left.version, content: left.base };
    this.history = takeStep(this.history, left.content);
    this.touched();
  }

  /** The page is shown. @returns what to do when it is left */
  open(): () => void {
    const online = () => {
      if (this.save.is === 'failed') void this.flush();
    };
    const hidden = () => {
      if (document.visibilityState !== 'hidden' || !this.isUnsaved()) return;
      this.writeDraft();
      void this.flush();
    };
    window.addEventListener('online', online);
    document.addEventListener('visibilitychange', hidden);
    return () => {
      window.removeEventListener('online', online);
      document.removeEventListener('visibilitychange', hidden);
      this.writeDraft();
      if (this.isUnsaved()) void this.flush();
      clearTimeout(this.timer);
    };
  }

  private step(next: History<T>): void {
    if (next === this.history) return;
    this.history = next;
    this.lastStep = null;
    this.touched();
  }

  private touched(): void {
    this.touchedAt = Date.now();
    this.keepDraft();
    clearTimeout(this.timer);
    const undecided = this.save.is === 'stale' && this.base.version < this.save.theirs.version;
    // what is written while the question is open, or a save is on its way, waits for it
    if (undecided || this.sending) this.report(this.save);
    else this.report({ is: this.isUnsaved() ? 'waiting' : 'saved' });
    if (!undecided && this.isUnsaved()) this.timer = setTimeout(() => void this.flush(), saveAfterMs);
  }

  /** A copy a moment later: of 6,000 lines it takes longer than a letter may. */
  private keepDraft(): void {
    clearTimeout(this.draftTimer);
    if (this.isUnsaved()) this.draftTimer = setTimeout(() => this.writeDraft(), draftAfterMs);
    else this.source.drafts.remove();
  }

  private writeDraft(): void {
    clearTimeout(this.draftTimer);
    if (!this.isUnsaved()) return;
    this.source.drafts.write({
      version: this.base.version,
      base: this.base.content,
      content: this.history.present,
      at: new Date().toISOString(),
    });
  }

  private send(): Promise<boolean> {
    if (this.sending) return this.sending;
    const sending = this.sendOnce().finally(() => {
      this.sending = null;
    });
    this.sending = sending;
    return sending;
  }

  private async sendOnce(): Promise<boolean> {
    const content = this.history.present;
    const fault = this.source.faultOf(content);
    if (fault !== null) {
      this.report({ is: 'refused', reason: fault });
      return false;
    }
    this.report({ is: 'saving' });
    try {
      return this.afterSave(await this.source.save(this.base.version, content), content);
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      const theirs = error.code === 'stale' ? this.source.readCurrent(error.current) : null;
      // an earlier save arrived and only its answer was lost
      if (theirs && isAlike(theirs.content, content)) return this.afterSave(theirs, content);
      this.report(theirs ? { is: 'stale', theirs } : this.afterFailure(error));
      return false;
    }
  }

  private afterSave(saved: Saved<T>, content: T): true {
    this.base = { version: saved.version, content };
    this.answered = saved.content;
    this.tries = 0;
    this.keepDraft();
    this.report({ is: this.isUnsaved() ? 'waiting' : 'saved' });
    return true;
  }

  private afterFailure(error: ApiError): SaveState<T> {
    if (error.code === 'invalid') return { is: 'refused', reason: Object.values(error.fields)[0] ?? error.message };
    const after = againAfterMs[this.tries];
    if (passing.has(error.code) && after !== undefined) {
      this.tries += 1;
      clearTimeout(this.timer);
      this.timer = setTimeout(() => void this.flush(), Math.max(after, (error.retryAfterSeconds ?? 0) * 1000));
    }
    return { is: 'failed', reason: error.message };
  }

  private report(save: SaveState<T>): void {
    this.save = save;
    this.snapshot = this.picture();
    for (const listener of this.listeners) listener();
  }

  private picture(): DocumentSnapshot<T> {
    return {
      content: this.history.present,
      base: this.base,
      save: this.save,
      canUndo: canUndo(this.history),
      canRedo: canRedo(this.history),
      left: this.left,
    };
  }
}

/** Both come out of the same schema, which puts their fields in the same order. */
const isAlike = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);
