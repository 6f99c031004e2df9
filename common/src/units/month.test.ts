import { expect, test } from 'vitest';
import { monthOf, monthOfDate } from './month';

test.each([
  ['Jan', 1],
  ['März', 3],
  ['août', 8],
  ['Dez.', 12],
  ['07', 7],
  ['m7', 7],
  ['annual mean', 'annual'],
  ['13', null],
  ['0', null],
  ['summer', null],
  ['', null],
])('as a month, "%s" is %s', (text, month) => expect(monthOf(text)).toBe(month));

test.each([
  ['2001-06', 6],
  ['2001-06-15', 6],
  ['15.06.2001', 6],
  ['01:06:2000', 6],
  ['06/15/2001', 6],
  ['15 June 2001', 6],
  ['3', 3],
  ['2001', null],
  ['2001-13', null],
  ['about noon', null],
])('the date "%s" falls in the month %s', (text, month) => expect(monthOfDate(text)).toBe(month));
