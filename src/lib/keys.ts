import { useEffect, useRef, useSyncExternalStore } from 'react';
import { readStored, writeStored } from './stored';

/** A key as people read it off the keyboard: `s`, `Enter`, `Space`, `ArrowLeft`, `Shift+ArrowLeft`, `Mod+z` (Ctrl, or Command on a Mac). */
export type KeyName = string;

export type KeyMap = Record<KeyName, (event: KeyboardEvent) => void>;

/** The name under which a key press is looked up. Shift is named only for keys that have no shifted letter of their own. */
export function keyName(event: Pick<KeyboardEvent, 'key' | 'shiftKey' | 'ctrlKey' | 'metaKey' | 'altKey'>): KeyName {
  const key = event.key === ' ' ? 'Space' : event.key;
  const isLetter = key.length === 1;
  const mod = event.ctrlKey || event.metaKey;
  const shift = event.shiftKey && (!isLetter || mod);
  return [mod && 'Mod', event.altKey && 'Alt', shift && 'Shift', isLetter ? key.toLowerCase() : key]
    .filter(Boolean)
    .join('+');
}

const typing =
  'input:not([type=checkbox],[type=radio],[type=range],[type=button]), textarea, select, [contenteditable]';
const pressing = 'button, a[href], summary, [role=option], [role=tab], input';

/** What a field does by itself with Ctrl or Command: cut, copy, paste, select all, undo, redo. */
const editing = /^Mod\+(Shift\+)?[acvxyz]$/;

/** Whether the press belongs to what has the focus: letters to a field, Space and Enter to a button. */
function isTaken(event: KeyboardEvent): boolean {
  const target = event.target instanceof Element ? event.target : null;
  if (target?.closest(typing)) {
    const name = keyName(event);
    return name !== 'Escape' && (!name.startsWith('Mod+') || editing.test(name));
  }
  return (event.key === ' ' || event.key === 'Enter') && target?.closest(pressing) != null;
}

const choiceKey = 'tapeline.keys';
let singleKeys = readStored(choiceKey) !== 'off';
const listeners = new Set<() => void>();

function subscribe(listener: () => void) {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Single-letter keys can be switched off (WCAG 2.2 SC 2.1.4): speech input types letters by accident. */
export function useSingleKeys(): ['on' | 'off', (next: 'on' | 'off') => void] {
  const on = useSyncExternalStore(subscribe, () => singleKeys);
  return [on ? 'on' : 'off', chooseSingleKeys];
}

export function chooseSingleKeys(next: 'on' | 'off'): void {
  singleKeys = next === 'on';
  writeStored(choiceKey, next);
  for (const listener of listeners) listener();
}

/**
 * Keys that work anywhere on the page while the component is shown, except in fields and behind an open dialog.
 * @param keys what each key does; the page's own use of the key is prevented
 * @param state `off` while they would do harm, for instance during a save
 */
export function useKeys(keys: KeyMap, state: 'on' | 'off' = 'on'): void {
  const latest = useRef(keys);
  useEffect(() => {
    latest.current = keys;
  });
  useEffect(() => {
    if (state === 'off') return;
    const press = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.isComposing || isTaken(event)) return;
      if (document.querySelector('dialog:modal')) return;
      const name = keyName(event);
      const action = latest.current[name];
      if (!action || (!singleKeys && name.length === 1)) return;
      event.preventDefault();
      action(event);
    };
    window.addEventListener('keydown', press);
    return () => window.removeEventListener('keydown', press);
  }, [state]);
}
