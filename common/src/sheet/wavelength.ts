import { cellAddress } from './grid';
import type { TableConstant, TableProposal } from './mapping';
import type { Claim } from './recognise-columns';

/** "AOD_500nm", "od550aer", "AOD at 0.55 µm": the wavelength that the heading of an optical depth names. */
export function wavelengthInHeading(claims: Claim[], table: TableProposal): TableConstant | null {
  const value = claims.find((claim) => claim.field === 'aod');
  const found = /(?<![\d.])(\d{3,4}(?:\.\d+)?)(?!\d)|(\d\.\d+)\s?[uµμ]m/iu.exec(value?.heading.text ?? '');
  if (!value || !found) return null;
  return {
    sheet: table.sheet,
    field: 'wavelengthNm',
    text: found[1] ?? found[2] ?? '',
    unit: found[1] === undefined ? 'µm' : 'nm',
    cell: table.headerRows[0] === undefined ? null : cellAddress(value.heading.index, table.headerRows[0]),
    reason: `Named in the heading "${value.heading.text}".`,
  };
}
