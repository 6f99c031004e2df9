import type { SampleRow } from '../dataset/sample-row';
import type { VettingContext } from './context';
import { archiveOf, countedRows } from './samples';
import { statements } from './wording';

/** Marine rows that would enter a version. */
export const marineRows = (context: VettingContext): SampleRow[] =>
  countedRows(context).filter((row) => archiveOf(context, row) === 'marine');

const THORIUM_230 = /230\s*-?\s*Th|Th(orium)?\s*-?\s*230|²³⁰Th/i;

/** Whether the texts speak of 230Th normalisation at all, be it done or not. */
export const speaksOfNormalisation = (context: VettingContext): boolean =>
  THORIUM_230.test(statements(context)) || /normali[sz]|focus+ing/i.test(statements(context));

/** Whether fluxes are said to be normalised to 230Th: the isotope is named and not denied. */
export const isNormalised = (context: VettingContext): boolean =>
  THORIUM_230.test(statements(context)) &&
  !/\b(not|no|without|un)[\s-]*(230\s*-?\s*Th|²³⁰Th|normali[sz])/i.test(statements(context));
