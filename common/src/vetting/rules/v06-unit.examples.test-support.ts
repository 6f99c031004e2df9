import { examplesOf } from './examples.test-support';
import { context, rows, unreadable, withColumn } from './rows.test-support';
import { unit } from './v06-unit';

const plain = context(rows({}, {}));
const apples = { fluxGM2Yr: null, cells: { fluxGM2Yr: unreadable('3', 'unit-unknown') } };

examplesOf(unit, {
  quiet: { 'the flux column has a unit that converts': plain },
  fires: {
    'no value of the flux column could be converted': {
      context: context(rows(apples, apples)),
      first: { severity: 'error', row: null, field: 'fluxGM2Yr', remedyKind: 'answer' },
    },
    'the unit of the flux column is one of concentration': {
      context: withColumn(plain, 'fluxGM2Yr', { unit: 'ng/g' }),
      first: { severity: 'error', row: null, field: 'fluxGM2Yr' },
    },
    'the flux column has no unit at all': {
      context: withColumn(plain, 'fluxGM2Yr', { unit: null, heading: 'flux' }),
      first: { severity: 'error', row: null, field: 'fluxGM2Yr', remedyKind: 'answer' },
    },
  },
});
