import { useLayoutEffect, useSyncExternalStore } from 'react';
import { type Room, rooms, type Theme } from '../styles/tokens';
import { readStored, writeStored } from './stored';

/** Light, dark, or whatever the room is by itself: the floor dark, the desk light. */
export type ThemeChoice = Theme | 'room';

// the same keys as in public/theme.js, which runs before the first paint
const themeKey = 'tapeline.theme';
const roomKey = 'tapeline.room';

export const ownTheme = { floor: 'dark', desk: 'light' } as const satisfies Record<Room, Theme>;

export function themeOf(choice: ThemeChoice, room: Room): Theme {
  return choice === 'room' ? ownTheme[room] : choice;
}

const asChoice = (text: string | null): ThemeChoice => (text === 'light' || text === 'dark' ? text : 'room');

let choice: ThemeChoice = asChoice(readStored(themeKey));
const listeners = new Set<() => void>();

function subscribe(listener: () => void) {
  const fromOtherTab = (event: StorageEvent) => {
    if (event.key !== themeKey) return;
    choice = asChoice(event.newValue);
    listener();
  };
  listeners.add(listener);
  window.addEventListener('storage', fromOtherTab);
  return () => {
    listeners.delete(listener);
    window.removeEventListener('storage', fromOtherTab);
  };
}

/** The person's choice, and how to change it; every open tab follows. */
export function useThemeChoice(): [ThemeChoice, (next: ThemeChoice) => void] {
  const current = useSyncExternalStore(subscribe, () => choice);
  return [current, chooseTheme];
}

export function chooseTheme(next: ThemeChoice): void {
  choice = next;
  writeStored(themeKey, next);
  for (const listener of listeners) listener();
}

/** The room that this browser was in last; a first visit is on the floor. */
export function lastRoom(): Room {
  return readStored(roomKey) === 'desk' ? 'desk' : 'floor';
}

/** Puts the whole page into a room, in the theme that the person chose. */
export function useRoom(room: Room): void {
  const [current] = useThemeChoice();
  useLayoutEffect(() => {
    const theme = themeOf(current, room);
    document.documentElement.dataset.room = room;
    document.documentElement.dataset.theme = theme;
    document.querySelector('meta[name="theme-color"]')?.setAttribute('content', rooms[room][theme].ground);
    writeStored(roomKey, room);
  }, [current, room]);
}
