import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatMs,
  formatMsExactly,
  formatMsWithTenths,
  parseTime,
  spokenMs,
  srtTimestamp,
  webvttTimestamp,
} from '../../shared/domain/timecode';

const anyTime = fc.integer({ min: 0, max: 86_399_999 });

describe('a time for people', () => {
  it.each([
    [0, '0:00', '0:00.0'],
    [271_200, '4:31', '4:31.2'],
    [3_723_000, '1:02:03', '1:02:03.0'],
    [59_999, '0:59', '0:59.9'],
    [3_600_000, '1:00:00', '1:00:00.0'],
  ])('writes %i ms as %s, and with tenths as %s', (ms, whole, tenths) => {
    expect(formatMs(ms)).toBe(whole);
    expect(formatMsWithTenths(ms)).toBe(tenths);
  });

  it('says a time in words, leaving out what is nothing', () => {
    expect(spokenMs(271_200)).toBe('4 minutes 31 seconds');
    expect(spokenMs(3_601_000)).toBe('1 hour 1 second');
    expect(spokenMs(0)).toBe('0 seconds');
  });

  it('gives back what was written exactly', () => {
    fc.assert(fc.property(anyTime, (ms) => void expect(parseTime(formatMsExactly(ms))).toBe(ms)));
    fc.assert(fc.property(anyTime, (ms) => void expect(parseTime(formatMsWithTenths(ms))).toBe(ms - (ms % 100))));
  });
});

describe('a time that somebody types', () => {
  it.each([
    ['4:31', 271_000],
    ['1:02:03.5', 3_723_500],
    ['271.2', 271_200],
    ['271,25', 271_250],
    [' 0:07.004 ', 7004],
    ['90:00', 5_400_000],
    ['0', 0],
  ])('reads %s as %i ms', (typed, ms) => {
    expect(parseTime(typed)).toBe(ms);
  });

  it.each([
    '',
    ':',
    '4:',
    ':31',
    '4:75',
    '1:75:00',
    '1:02:003',
    '-4:31',
    '4:31.2345',
    'half past',
    '25:00:00',
    '4 31',
    '1e3',
  ])('refuses “%s”', (typed) => {
    expect(parseTime(typed)).toBeNull();
  });
});

describe('a time in a caption file', () => {
  // Source: W3C WebVTT, "WebVTT timestamp" (hours optional, two digits or more; minutes and seconds ≤ 59; three ms digits)
  it('has two digits of hours, minutes and seconds, and three of milliseconds', () => {
    fc.assert(
      fc.property(anyTime, (ms) => {
        expect(webvttTimestamp(ms)).toMatch(/^\d{2}:[0-5]\d:[0-5]\d\.\d{3}$/);
        expect(parseTime(webvttTimestamp(ms))).toBe(ms);
      }),
    );
    expect(webvttTimestamp(271_200)).toBe('00:04:31.200');
    expect(srtTimestamp(271_200)).toBe('00:04:31,200');
    // hours may have more than two digits: nasty.json "S14 h>99"
    expect(webvttTimestamp(360_001_000)).toBe('100:00:01.000');
  });
});
