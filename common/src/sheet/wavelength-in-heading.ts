import { cellAddress } from './grid';
import type { Heading } from './heading';
import type { TableConstant, TableProposal } from './mapping';

/** "AOD_500nm", "od550aer", "AOD at 0.55 µm": the wavelength that a heading names [nm], or null. */
export function wavelengthNmIn(heading: string): number | null {
  const found = /(?<![\d.])(\d{3,4}(?:\.\d+)?)(?!\d)|(\d\.\d+)\s?[uµμ]m/iu.exec(heading);
  if (!found) return null;
  return found[1] === undefined ? Math.round(Number(found[2]) * 1e6) / 1e3 : Number(found[1]);
}

/** The wavelength as a constant of the table, where the heading of its optical depth names one. */
export function wavelengthConstant(
  heading: Heading & { index: number },
  table: TableProposal,
): TableConstant | null {
  const wavelength = wavelengthNmIn(heading.text);
  if (wavelength === null) return null;
  return {
    sheet: table.sheet,
    field: 'wavelengthNm',
    text: String(wavelength),
    unit: 'nm',
    cell: table.headerRows[0] === undefined ? null : cellAddress(heading.index, table.headerRows[0]),
    reason: `Named in the heading "${heading.text}".`,
  };
}
