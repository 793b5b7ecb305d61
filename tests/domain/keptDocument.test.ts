import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { ApiError } from '../../src/lib/api';
import type { Draft } from '../../src/lib/drafts';
import { KeptDocument, type Saved } from '../../src/lib/keptDocument';

/** A server with one list of words, versions and all; it can be cut off, or lose its answer. */
class Shelf {
  saved: Saved<readonly string[]> = { version: 1, content: ['one'] };
  line: 'good' | 'cut' | 'answerLost' = 'good';
  saves = 0;

  async save(version: number, content: readonly string[]): Promise<Saved<readonly string[]>> {
    const offline = new ApiError('offline', 'Not reached.', 0);
    if (this.line === 'cut') throw offline;
    if (version !== this.saved.version) throw new ApiError('stale', 'Newer.', 409, {}, null, this.saved);
    if (content.includes('odd')) throw new ApiError('invalid', 'No.', 400, { 'items.0': 'This word is odd.' });
    this.saves += 1;
    this.saved = { version: version + 1, content: [...content] };
    if (this.line === 'answerLost') throw offline;
    return this.saved;
  }
}

function open(shelf: Shelf, left: Draft<readonly string[]> | null = null) {
  const drafts: { kept: Draft<readonly string[]> | null } = { kept: left };
  const kept = new KeptDocument<readonly string[]>(shelf.saved, {
    save: (version, content) => shelf.save(version, content),
    readCurrent: (current) => current as Saved<readonly string[]>,
    faultOf: (content) => (content.includes('') ? 'A word is empty.' : null),
    drafts: {
      read: () => drafts.kept,
      write: (draft) => {
        drafts.kept = draft;
      },
      remove: () => {
        drafts.kept = null;
      },
    },
  });
  return { kept, drafts };
}

describe('a document that saves itself', () => {
  beforeEach(() => {
    vi.useFakeTimers();
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  it('saves once, a pause after the last change, and keeps a copy until then', async () => {
    const shelf = new Shelf();
    const { kept, drafts } = open(shelf);
    kept.change(['one', 't']);
    await vi.advanceTimersByTimeAsync(600);
    expect(drafts.kept?.content).toEqual(['one', 't']);
    kept.change(['one', 'two']);
    expect(kept.current().save.is).toBe('waiting');
    await vi.advanceTimersByTimeAsync(1000);
    expect(shelf).toMatchObject({ saves: 1, saved: { version: 2, content: ['one', 'two'] } });
    expect(kept.current().save.is).toBe('saved');
    expect(drafts.kept).toBeNull();
  });

  it('is saved again without sending anything when a change is undone in time', async () => {
    const shelf = new Shelf();
    const { kept } = open(shelf);
    kept.change(['one', 'two']);
    kept.undo();
    await vi.advanceTimersByTimeAsync(5000);
    expect(kept.isUnsaved()).toBe(false);
    expect(shelf.saves).toBe(0);
    kept.redo();
    await vi.advanceTimersByTimeAsync(1000);
    expect(shelf.saved.content).toEqual(['one', 'two']);
  });

  it('makes one step of changes of a group in quick succession, and two of what is slower', async () => {
    const { kept } = open(new Shelf());
    kept.change(['o'], 'text');
    kept.change(['on'], 'text');
    await vi.advanceTimersByTimeAsync(3000);
    kept.change(['once'], 'text');
    kept.undo();
    expect(kept.current().content).toEqual(['on']);
    kept.undo();
    expect(kept.current().content).toEqual(['one']);
  });

  it('sends nothing that has a fault, and says which', async () => {
    const shelf = new Shelf();
    const { kept } = open(shelf);
    kept.change(['']);
    await vi.advanceTimersByTimeAsync(1000);
    expect(kept.current().save).toEqual({ is: 'refused', reason: 'A word is empty.' });
    kept.change(['odd']);
    await vi.advanceTimersByTimeAsync(1000);
    expect(kept.current().save).toEqual({ is: 'refused', reason: 'This word is odd.' });
    expect(shelf.saves).toBe(0);
    expect(kept.current().content).toEqual(['odd']);
  });

  it('tries again by itself when the line was cut, with all that was written meanwhile', async () => {
    const shelf = new Shelf();
    const { kept } = open(shelf);
    shelf.line = 'cut';
    kept.change(['one', 'two']);
    await vi.advanceTimersByTimeAsync(1000);
    expect(kept.current().save.is).toBe('failed');
    shelf.line = 'good';
    await vi.advanceTimersByTimeAsync(3000);
    expect(shelf.saved.content).toEqual(['one', 'two']);
    expect(kept.current().save.is).toBe('saved');
  });

  it('takes a save whose answer was lost as saved, not as somebody else’s', async () => {
    const shelf = new Shelf();
    const { kept } = open(shelf);
    shelf.line = 'answerLost';
    kept.change(['one', 'two']);
    await vi.advanceTimersByTimeAsync(1000);
    shelf.line = 'good';
    expect(await kept.flush()).toBe(true);
    expect(kept.current()).toMatchObject({ save: { is: 'saved' }, base: { version: 2 } });
    expect(shelf.saves).toBe(1);
  });

  describe('when somebody else saved meanwhile', () => {
    const stale = async () => {
      const shelf = new Shelf();
      const opened = open(shelf);
      opened.kept.change(['mine']);
      shelf.saved = { version: 2, content: ['theirs'] };
      await vi.advanceTimersByTimeAsync(1000);
      return { shelf, ...opened };
    };

    it('stops and overwrites nothing, whatever else is written', async () => {
      const { shelf, kept } = await stale();
      kept.change(['mine', 'more']);
      await vi.advanceTimersByTimeAsync(60_000);
      expect(kept.current().save).toEqual({ is: 'stale', theirs: { version: 2, content: ['theirs'] } });
      expect(shelf.saved).toEqual({ version: 2, content: ['theirs'] });
      expect(kept.current().content).toEqual(['mine', 'more']);
    });

    it('takes theirs, and undo brings mine back', async () => {
      const { shelf, kept } = await stale();
      kept.decide('theirs');
      expect(kept.current()).toMatchObject({ content: ['theirs'], save: { is: 'saved' } });
      kept.undo();
      await vi.advanceTimersByTimeAsync(1000);
      expect(shelf.saved).toEqual({ version: 3, content: ['mine'] });
    });

    it.each([
      ['mine', ['mine']],
      [{ both: ['mine', 'theirs'] }, ['mine', 'theirs']],
    ] as const)('saves %j over theirs', async (choice, content) => {
      const { shelf, kept } = await stale();
      kept.decide(choice);
      await vi.advanceTimersByTimeAsync(0);
      expect(shelf.saved).toEqual({ version: 3, content });
      expect(kept.current().save.is).toBe('saved');
    });
  });

  it('shows a newer version at once when nothing is unsaved, and never over unsaved changes', () => {
    const { kept } = open(new Shelf());
    expect(kept.offer({ version: 2, content: ['theirs'] })).toBe(true);
    expect(kept.current().content).toEqual(['theirs']);
    kept.change(['mine']);
    expect(kept.offer({ version: 3, content: ['theirs again'] })).toBe(false);
    expect(kept.current().content).toEqual(['mine']);
  });

  it('shows the same version again only when the server changed it, and says nothing of somebody else', async () => {
    const { kept } = open(new Shelf());
    kept.change(['one', 'two']);
    await vi.advanceTimersByTimeAsync(1000);
    expect(kept.offer({ version: 2, content: ['one', 'two'] })).toBe(false);
    expect(kept.current().canUndo).toBe(true);
    expect(kept.offer({ version: 2, content: ['one'] })).toBe(false);
    expect(kept.current().content).toEqual(['one']);
  });

  describe('what an earlier visit left', () => {
    const at = '2026-03-03T06:00:00.000Z';

    it('is offered, taken up and saved', async () => {
      const shelf = new Shelf();
      const { kept } = open(shelf, { version: 1, base: ['one'], content: ['one', 'left'], at });
      expect(kept.current()).toMatchObject({ content: ['one'], left: { content: ['one', 'left'] } });
      kept.takeUp('take');
      await vi.advanceTimersByTimeAsync(1000);
      expect(shelf.saved.content).toEqual(['one', 'left']);
    });

    it('is compared first when somebody saved since', async () => {
      const shelf = new Shelf();
      shelf.saved = { version: 5, content: ['theirs'] };
      const { kept } = open(shelf, { version: 4, base: ['one'], content: ['left'], at });
      kept.takeUp('take');
      await vi.advanceTimersByTimeAsync(1000);
      expect(kept.current()).toMatchObject({ save: { is: 'stale' }, base: { version: 4, content: ['one'] } });
      expect(shelf.saved.content).toEqual(['theirs']);
    });

    it('is gone when dropped, and never offered when it was saved after all', () => {
      const dropped = open(new Shelf(), { version: 1, base: ['one'], content: ['left'], at });
      dropped.kept.takeUp('drop');
      expect(dropped.drafts.kept).toBeNull();
      expect(dropped.kept.current().content).toEqual(['one']);
      const arrived = open(new Shelf(), { version: 0, base: [], content: ['one'], at });
      expect(arrived.kept.current().left).toBeNull();
      expect(arrived.drafts.kept).toBeNull();
    });
  });
});
