import { describe, expect, it } from 'vitest';
import { constants, rooms, tape } from '../../src/styles/tokens';

/** WCAG 2.2, "relative luminance" and "contrast ratio", of colours written #rrggbb. */
function luminance(colour: string): number {
  const [red, green, blue] = [1, 3, 5].map((at) => {
    const share = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(one: string, other: string): number {
  const [light, dark] = [luminance(one), luminance(other)].sort((a, b) => b - a) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

const palettes = Object.entries(rooms).flatMap(([room, themes]) =>
  Object.entries(themes).map(([theme, palette]) => ({ name: `${room}, ${theme}`, palette })),
);

describe('contrast as WCAG counts it', () => {
  // computed outside with an independent tool
  it.each([
    ['#767676', 4.54],
    ['#777777', 4.48],
    ['#949494', 3.03],
    ['#959595', 2.995],
    ['#595959', 7.0],
  ])('of %s on white is %f', (colour, ratio) => {
    expect(contrast(colour, '#ffffff')).toBeCloseTo(ratio, ratio === 2.995 ? 3 : 2);
  });

  it('is the same both ways, 21 between black and white and 1 with itself', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
    expect(contrast('#ffffff', '#000000')).toBeCloseTo(21, 5);
    expect(contrast('#f7cb3f', '#f7cb3f')).toBe(1);
  });
});

describe.each(palettes)('$name', ({ palette }) => {
  const grounds = [palette.ground, palette.surface, palette.raised, palette.tint];

  it.each(['ink', 'ink2', 'danger', 'good'] as const)('%s can be read on every ground', (text) => {
    for (const ground of grounds) expect(contrast(palette[text], ground)).toBeGreaterThanOrEqual(4.5);
  });

  it('shows the edge of what can be pressed or typed into', () => {
    for (const ground of grounds) expect(contrast(palette.edge, ground)).toBeGreaterThanOrEqual(3);
  });

  it('shows every tape against the ground, by its colour or by its edge', () => {
    for (const { colour } of Object.values(tape)) {
      for (const ground of grounds) {
        const seen = palette.tapeEdge === 'transparent' ? colour : palette.tapeEdge;
        expect(contrast(seen, ground)).toBeGreaterThanOrEqual(3);
      }
    }
  });

  it('reads the ground on ink, as on a chip that is on', () => {
    expect(contrast(palette.ground, palette.ink)).toBeGreaterThanOrEqual(4.5);
  });

  it('reads a found word on its mark', () => {
    expect(contrast(palette.onMarked, palette.marked)).toBeGreaterThanOrEqual(4.5);
  });
});

describe('what is the same in every room', () => {
  it('reads ink on yellow', () => {
    expect(contrast(constants.onYellow, constants.yellow)).toBeGreaterThanOrEqual(4.5);
  });

  it('tells neighbouring tapes apart by weave where their colours are near', () => {
    const looks = Object.values(tape).map(({ colour, weave }) => `${colour} ${weave}`);
    expect(new Set(Object.values(tape).map(({ weave }) => weave)).size).toBe(looks.length);
  });
});
