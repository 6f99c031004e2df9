import { examplesOf } from './examples.test-support';
import { context, row, rows, unreadable } from './rows.test-support';
import { unreadableValue } from './v03-unreadable-value';

examplesOf(unreadableValue, {
  quiet: {
    'every cell was read': context(rows({}, {})),
    'a flux is missing by a code': context([
      row({ fluxGM2Yr: null, cells: { fluxGM2Yr: { raw: '-999', value: null } } }),
    ]),
    'the fault is one of units': context([
      row({ fluxGM2Yr: null, cells: { fluxGM2Yr: unreadable('3', 'unknown-unit') } }),
    ]),
  },
  fires: {
    'the flux column holds a word': {
      context: context([row({ row: 7, fluxGM2Yr: null, cells: { fluxGM2Yr: unreadable('about 3') } })]),
      first: { severity: 'error', sheet: 'Data', row: 7, field: 'fluxGM2Yr', remedyKind: 'mend' },
    },
    'an age cannot be read in a row with no flux': {
      context: context([row({ fluxGM2Yr: null, ageKaBp: null, cells: { ageKaBp: unreadable('top') } })]),
      first: { severity: 'note', field: 'ageKaBp' },
    },
  },
});
