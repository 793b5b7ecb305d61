import type { ChapterKind } from '../../shared/domain/words';

/** Every value of the look, once: tailwind.config.ts turns them into custom properties and classes, a test computes their contrast. */

export type Room = 'floor' | 'desk';
export type Theme = 'light' | 'dark';

export type Palette = {
  ground: string;
  surface: string;
  raised: string;
  /** thin lines that only divide */
  line: string;
  /** the border of what can be typed into or pressed: 3 to 1 against what is around it (WCAG 2.2 SC 1.4.11) */
  edge: string;
  ink: string;
  ink2: string;
  danger: string;
  good: string;
  /** the row one is at */
  tint: string;
  /** behind a word that was found or is misheard */
  marked: string;
  onMarked: string;
  /** around tape, where the ground is light */
  tapeEdge: string;
  tapeEdgeWidth: string;
};

const yellow = '#f7cb3f';
const onYellow = '#17191a';

/** Floor is for watching and training, desk for planning and correcting. Dark is the floor's own theme, light the desk's. */
export const rooms = {
  floor: {
    dark: {
      ground: '#15181a',
      surface: '#1f2427',
      raised: '#2a3034',
      line: '#3a4246',
      edge: '#727b7f',
      ink: '#f6f3ea',
      ink2: '#b6bab6',
      danger: '#ff8a80',
      good: '#8fd37f',
      tint: '#2f2e24',
      marked: yellow,
      onMarked: onYellow,
      tapeEdge: 'transparent',
      tapeEdgeWidth: '0px',
    },
    light: {
      ground: '#eceae3',
      surface: '#f9f7f2',
      raised: '#dedbd1',
      line: '#c9c5b8',
      edge: '#757672',
      ink: '#15181a',
      ink2: '#4c5355',
      danger: '#981f18',
      good: '#265c1e',
      tint: '#f8eab8',
      marked: '#fbe08a',
      onMarked: onYellow,
      tapeEdge: '#4d4e49',
      tapeEdgeWidth: '1.5px',
    },
  },
  desk: {
    light: {
      ground: '#f5f3ed',
      surface: '#fffefb',
      raised: '#ebe8df',
      line: '#d5d1c4',
      edge: '#7d7f7a',
      ink: '#1b1e1f',
      ink2: '#565c5d',
      danger: '#a3241c',
      good: '#2d6a24',
      tint: '#fdf3cf',
      marked: '#fbe7a1',
      onMarked: onYellow,
      tapeEdge: '#4d4e49',
      tapeEdgeWidth: '1.5px',
    },
    dark: {
      ground: '#1b1e1f',
      surface: '#25292b',
      raised: '#313638',
      line: '#434a4d',
      edge: '#7d8588',
      ink: '#f3f0e7',
      ink2: '#b9bdb9',
      danger: '#ff8a80',
      good: '#8fd37f',
      tint: '#373425',
      marked: yellow,
      onMarked: onYellow,
      tapeEdge: 'transparent',
      tapeEdgeWidth: '0px',
    },
  },
} as const satisfies Record<Room, Record<Theme, Palette>>;

/** The same in every room and theme. `shade` lies over pictures, under white letters. */
export const constants = { yellow, onYellow, shade: 'rgb(15 17 18 / 0.82)', onShade: '#ffffff' } as const;

/** What a room asks of everything that can be pressed. A finger on the desk still gets 44 px: see base.css. */
export const targets = {
  floor: { target: '3rem', targetSmall: '2.5rem' },
  desk: { target: '2.5rem', targetSmall: '2.25rem' },
} as const satisfies Record<Room, { target: string; targetSmall: string }>;

const ink = (share: number) => `rgb(20 22 23 / ${share})`;

/** Real tape doesn't change with the light: one colour and one weave a kind. An aside was never taped: a dotted line. */
export const tape = {
  briefing: {
    colour: '#e7e3d6',
    weave: `linear-gradient(transparent 42%, ${ink(0.55)} 42% 58%, transparent 58%)`,
  },
  'warm-up': {
    colour: '#f2954a',
    weave: `repeating-linear-gradient(45deg, transparent 0 7px, ${ink(0.38)} 7px 10px)`,
  },
  activation: {
    colour: '#f4b9c4',
    weave: `radial-gradient(circle, ${ink(0.55)} 1.8px, transparent 2.2px) 0 0 / 9px 7px`,
  },
  mobility: {
    colour: '#4fbdb2',
    weave: `repeating-linear-gradient(90deg, ${ink(0.5)} 0 8px, transparent 8px 15px) 0 50% / 100% 3px no-repeat`,
  },
  demo: { colour: yellow, weave: 'none' },
  substitution: {
    colour: '#6aa9f0',
    weave: `linear-gradient(transparent 24%, ${ink(0.5)} 24% 36%, transparent 36% 64%, ${ink(0.5)} 64% 76%, transparent 76%)`,
  },
  workout: {
    colour: '#ee5f55',
    weave: `repeating-linear-gradient(-45deg, ${ink(0.6)} 0 9px, transparent 9px 20px)`,
  },
  accessory: {
    colour: '#b692ea',
    weave: `repeating-linear-gradient(45deg, transparent 0 5px, ${ink(0.34)} 5px 6.5px), repeating-linear-gradient(-45deg, transparent 0 5px, ${ink(0.34)} 5px 6.5px)`,
  },
  'cool-down': {
    colour: '#86c873',
    weave: `repeating-linear-gradient(90deg, ${ink(0.4)} 0 2px, transparent 2px 8px)`,
  },
} as const satisfies Record<Exclude<ChapterKind, 'aside'>, { colour: string; weave: string }>;

/** Sizes in rem of 16 px, so that a person's own letter size counts: 12.5 · 14 · 16 · 17 · 20 · 28 · the clock's 148. */
export const letters = {
  xs: ['0.78125rem', '1.35'],
  sm: ['0.875rem', '1.4'],
  base: ['1rem', '1.5'],
  md: ['1.0625rem', '1.3'],
  lg: ['1.25rem', '1.25'],
  xl: ['1.75rem', '1.12'],
  clock: ['clamp(5rem, 37.9vw, 9.25rem)', '0.95'],
} as const satisfies Record<string, readonly [size: string, lineHeight: string]>;
