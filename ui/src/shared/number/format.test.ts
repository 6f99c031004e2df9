import {
  decimalsForInterval,
  digitGroups,
  formatAgeSpan,
  formatBytes,
  formatForcing,
  formatNumber,
  scientificParts,
} from './format';
import { formatDuration } from './time';

test('a negative number carries the true minus sign', () => {
  expect(formatForcing(-0.42)).toBe('\u22120.42');
  expect(formatForcing(0.19)).toBe('+0.19');
});

test('a value that rounds to zero carries no sign', () => {
  expect(formatForcing(-0.001)).toBe('0.00');
  expect(formatForcing(0.001)).toBe('0.00');
});

test('an interval supports two figures of its width and no more', () => {
  expect(decimalsForInterval(-0.81, -0.12)).toBe(2);
  expect(decimalsForInterval(-3, -0.7)).toBe(1);
  expect(decimalsForInterval(-30, 5)).toBe(0);
  expect(decimalsForInterval(0.4, 0.4, 3)).toBe(3);
});

test('significant figures hold for small and large values', () => {
  expect(formatNumber(0.012345, { figures: 3 })).toBe('0.0123');
  expect(formatNumber(12345, { figures: 3 })).toBe('12345');
});

test('digits are grouped in threes from five digits on, the sign and the fraction stay with their ends', () => {
  expect(digitGroups('1234')).toEqual(['1234']);
  expect(digitGroups('\u22121234567.25')).toEqual(['\u22121', '234', '567.25']);
});

test('very large and very small values take a power of ten', () => {
  expect(scientificParts(0.00012)).toEqual({ mantissa: '1.20', exponent: -4 });
  expect(scientificParts(12)).toBeNull();
});

test('ages, sizes and durations are written without needless figures', () => {
  expect(formatAgeSpan(19, 23)).toBe('23 to 19 ka');
  expect(formatAgeSpan(635_000, 650_000)).toBe('650 to 635 Ma');
  expect(formatAgeSpan(0.05, 5.5)).toBe('5.5 to 0.05 ka');
  expect(formatBytes(999)).toBe('999 B');
  expect(formatBytes(1_234_567)).toBe('1.23 MB');
  expect(formatDuration(45)).toBe('45 s');
  expect(formatDuration(26 * 3600)).toBe('26 h');
  expect(formatDuration(9 * 86_400)).toBe('9 days');
});
