import { examplesOf } from './examples.test-support';
import { context, row, rows, unreadable, withRawCell } from './rows.test-support';
import { spreadsheetCells } from './v02-spreadsheet-cells';

const plain = context(rows({}, {}));
const fluxCell = plain.rows[0]!.cells.fluxGM2Yr!.cell!;
const siteCell = plain.rows[0]!.cells.site!.cell!;
const column = fluxCell.replace(/\d+/, '');
const broken = context([row({ fluxGM2Yr: null, cells: { fluxGM2Yr: unreadable('#REF!', 'error-value') } })]);

examplesOf(spreadsheetCells, {
  quiet: { 'cells hold plain values': plain },
  fires: {
    'a value is computed by a formula': {
      context: withRawCell(plain, fluxCell, { text: '0.01', number: 0.01, kind: 'number', formula: 'A1*2' }),
      first: { severity: 'warning', row: null, column, remedyKind: 'waive' },
    },
    'a cell holds an error value': {
      context: withRawCell(broken, fluxCell, { text: '#REF!', kind: 'error' }),
      first: { severity: 'error', row: 2, column, remedyKind: 'mend' },
    },
    'a site name became a date': {
      context: withRawCell(plain, siteCell, { text: '1-Feb', kind: 'date' }),
      first: { severity: 'warning', row: 2, field: 'site' },
    },
  },
});
