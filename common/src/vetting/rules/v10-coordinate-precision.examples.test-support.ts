import { examplesOf } from './examples.test-support';
import { context, row, rows } from './rows.test-support';
import { coordinatePrecision } from './v10-coordinate-precision';

const minutes = { latitudeDeg: { raw: "75°06'S", value: -75.1 }, longitudeDeg: { raw: '123°E', value: 123 } };
const at = (site: string, latitudeDeg: number) => ({ site, latitudeDeg, longitudeDeg: 10 });

examplesOf(coordinatePrecision, {
  quiet: {
    'one of the two coordinates shows two decimals': context(
      rows({ latitudeDeg: 75.1, longitudeDeg: -42.32 }),
    ),
    'the position is in degrees and minutes': context([
      row({ latitudeDeg: -75.1, longitudeDeg: 123, cells: minutes }),
    ]),
  },
  fires: {
    'a position has one decimal': {
      context: context(rows({ latitudeDeg: 75.1, longitudeDeg: -42.3 })),
      first: { severity: 'warning', row: 2, remedyKind: 'waive' },
    },
    'most sites lie on whole degrees, each and together': {
      context: context(rows(at('A', 10), at('B', 20), at('C', 30), at('D', 40))),
      hits: 5,
      first: { sheet: null },
    },
  },
});
