import type { Config } from 'tailwindcss';
import plugin from 'tailwindcss/plugin';
import { constants, letters, type Palette, type Room, rooms, type Theme, tape, targets } from './src/styles/tokens';

const property = (name: string) => `--${name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`)}`;

const properties = (values: Record<string, string>) =>
  Object.fromEntries(Object.entries(values).map(([name, value]) => [property(name), value]));

const paletteRules = (Object.entries(rooms) as [Room, Record<Theme, Palette>][]).flatMap(([room, themes]) =>
  (Object.entries(themes) as [Theme, Palette][]).map(([theme, palette]) => [
    `[data-room='${room}'][data-theme='${theme}']`,
    { ...properties({ ...palette, ...targets[room] }), 'color-scheme': theme },
  ]),
);

const tapeRules = Object.entries(tape).map(([kind, { colour, weave }]) => [
  `[data-tape='${kind}']`,
  { '--tape': colour, '--weave': weave },
]);

const colour = (name: string) => `var(${property(name)})`;
const named = (names: readonly string[]) => Object.fromEntries(names.map((name) => [name, colour(name)]));

export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-theme="dark"]'],
  theme: {
    extend: {
      colors: {
        ...named([
          'ground',
          'surface',
          'raised',
          'line',
          'edge',
          'ink',
          'ink2',
          'danger',
          'good',
          'tint',
          'marked',
          'onMarked',
        ]),
        ...named(Object.keys(constants)),
        tape: Object.fromEntries(Object.entries(tape).map(([kind, look]) => [kind, look.colour])),
      },
      fontFamily: { sans: ['"Nunito Sans"', 'system-ui', 'sans-serif'] },
      fontSize: Object.fromEntries(
        Object.entries(letters).map(([name, [size, lineHeight]]) => [name, [size, { lineHeight }]]),
      ),
      borderRadius: { DEFAULT: '3px', still: '2px' },
      borderWidth: { thin: '1.5px' },
      spacing: { target: 'var(--target)', targetSmall: 'var(--target-small)', nav: 'var(--nav)' },
    },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({ ':root': properties(constants), ...Object.fromEntries([...paletteRules, ...tapeRules]) });
    }),
  ],
} satisfies Config;
