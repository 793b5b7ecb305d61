import { describe, expect, it } from 'vitest';
import { keyName } from '../../src/lib/keys';
import { placeBeside } from '../../src/lib/placement';

const press = (key: string, held: Partial<Record<'shiftKey' | 'ctrlKey' | 'metaKey' | 'altKey', boolean>> = {}) =>
  keyName({ key, shiftKey: false, ctrlKey: false, metaKey: false, altKey: false, ...held });

describe('the name of a key press', () => {
  it('is the letter in lower case, with Caps Lock too', () => {
    expect(press('s')).toBe('s');
    expect(press('S')).toBe('s');
  });

  it('names the space bar, and Shift only where the key has no letter of its own', () => {
    expect(press(' ')).toBe('Space');
    expect(press('?', { shiftKey: true })).toBe('?');
    expect(press('ArrowLeft', { shiftKey: true })).toBe('Shift+ArrowLeft');
  });

  it('is the same with Ctrl and with Command', () => {
    expect(press('z', { ctrlKey: true })).toBe('Mod+z');
    expect(press('Z', { metaKey: true, shiftKey: true })).toBe('Mod+Shift+z');
  });
});

describe('where a list opens', () => {
  const window = { width: 400, height: 800 };
  const at = (top: number) => ({ top, bottom: top + 40, left: 20, right: 220, width: 200 });

  it('is below what opened it, no higher than the window has room', () => {
    expect(placeBeside(at(100), window, 'fill')).toEqual({ top: 144, left: 20, width: 200, maxHeight: 648 });
  });

  it('is above when there is little room below and more above', () => {
    expect(placeBeside(at(700), window, 'start')).toEqual({ bottom: 104, left: 20, maxHeight: 688 });
  });

  it('ends where what opened it ends, and never outside of the window', () => {
    expect(placeBeside(at(100), window, 'end')).toMatchObject({ right: 180 });
    expect(placeBeside({ ...at(100), right: 420 }, window, 'end')).toMatchObject({ right: 8 });
  });
});
