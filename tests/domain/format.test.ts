import { describe, expect, it } from 'vitest';
import {
  formatAgo,
  formatBytes,
  formatCount,
  formatDate,
  formatDay,
  formatInstant,
  formatList,
  formatShare,
  formatSpan,
  todayIn,
} from '../../src/lib/format';

describe('dates for people', () => {
  it('writes weekday, day and month, and the year only when it is another one', () => {
    expect(formatDate('2026-03-03')).toBe('Tue 3 March');
    expect(formatDate('2026-03-03', '2026-12-31')).toBe('Tue 3 March');
    expect(formatDate('2025-12-31', '2026-01-01')).toBe('Wed 31 December 2025');
  });

  it('names the days around today, across the end of a year and a change of clocks', () => {
    expect(formatDay('2026-01-01', '2025-12-31')).toBe('Tomorrow');
    expect(formatDay('2026-03-28', '2026-03-29')).toBe('Yesterday');
    expect(formatDay('2026-03-29', '2026-03-29')).toBe('Today');
    expect(formatDay('2026-03-31', '2026-03-29')).toBe('Tue 31 March');
  });

  it('knows that today depends on where the team is', () => {
    const now = new Date('2026-03-03T23:30:00Z');
    expect(todayIn('Europe/Lisbon', now)).toBe('2026-03-03');
    expect(todayIn('Europe/Berlin', now)).toBe('2026-03-04');
    expect(todayIn('America/Los_Angeles', now)).toBe('2026-03-03');
  });

  it('writes an instant in the time zone of the team, midnight as 00:00', () => {
    expect(formatInstant('2026-03-03T17:00:00Z', 'Europe/Berlin')).toBe('Tue 3 March, 18:00');
    expect(formatInstant('2026-03-03T23:00:00Z', 'Europe/Berlin')).toBe('Wed 4 March, 00:00');
  });

  it('says how long ago', () => {
    const now = new Date('2026-03-03T12:00:00Z');
    expect(formatAgo('2026-03-03T11:59:31Z', now)).toBe('just now');
    expect(formatAgo('2026-03-03T11:55:00Z', now)).toBe('5 minutes ago');
    expect(formatAgo('2026-03-03T10:00:00Z', now)).toBe('2 hours ago');
    expect(formatAgo('2026-03-02T11:00:00Z', now)).toBe('yesterday');
  });
});

describe('amounts for people', () => {
  it('writes lengths for planning', () => {
    expect(formatSpan(40_000)).toBe('40 s');
    expect(formatSpan(46 * 60_000)).toBe('46 min');
    expect(formatSpan(60 * 60_000)).toBe('1 h');
    expect(formatSpan(65 * 60_000)).toBe('1 h 5 min');
  });

  it('writes sizes in decimal units and never 1000 of one', () => {
    expect(formatBytes(0)).toBe('0 bytes');
    expect(formatBytes(999)).toBe('999 bytes');
    expect(formatBytes(320_000)).toBe('320 kB');
    expect(formatBytes(999_900)).toBe('1 MB');
    expect(formatBytes(1_240_000_000)).toBe('1.2 GB');
  });

  it('counts one, many and too many to count', () => {
    expect(formatCount(1, 'member', 'members')).toBe('1 member');
    expect(formatCount(0, 'member', 'members')).toBe('0 members');
    expect(formatCount(1000, 'moment', 'moments', 1000)).toBe('1000+ moments');
  });

  it('joins words as one says them', () => {
    expect(formatList(['rings'])).toBe('rings');
    expect(formatList(['rings', 'rope', 'box'])).toBe('rings, rope and box');
    expect(formatList(['rings', 'rope'], 'or')).toBe('rings or rope');
  });

  it('never says 100 % before it is done', () => {
    expect(formatShare(0.9999)).toBe('99 %');
    expect(formatShare(1)).toBe('100 %');
    expect(formatShare(-0.2)).toBe('0 %');
  });
});
