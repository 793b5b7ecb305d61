import type { Dress } from './figure';

/** What the coaches wear. */
export const dresses = {
  green: {
    shirt: '#2f6f62',
    sleeve: '#2f6f62',
    legs: '#23292d',
    farLegs: '#454e53',
    skin: '#b9683f',
    shoes: '#f0ece0',
    hair: '#1f1a17',
    hairCut: 'short',
  },
  plum: {
    shirt: '#7b3f6d',
    sleeve: '#7b3f6d',
    legs: '#2c3550',
    farLegs: '#4f5876',
    skin: '#d79c76',
    shoes: '#e2574c',
    hair: '#7a4a22',
    hairCut: 'bun',
  },
  rust: {
    shirt: '#c25b2c',
    sleeve: '#c25b2c',
    legs: '#3a3f44',
    farLegs: '#5d646a',
    skin: '#8a5637',
    shoes: '#f2c53d',
    hair: '#33505f',
    hairCut: 'cap',
  },
} as const satisfies Record<string, Dress>;

export type DressName = keyof typeof dresses;
