import { examplesOf } from './examples.test-support';
import { context, row, rows, unreadable } from './rows.test-support';
import { elevationRange } from './v13-elevation-range';

examplesOf(elevationRange, {
  quiet: { 'elevation and depth are possible': context(rows({ elevationM: 3233 }, { waterDepthM: 4200 })) },
  fires: {
    'an elevation is in feet': {
      context: context(rows({ elevationM: 10607 })),
      first: { severity: 'error', row: 2, field: 'elevationM' },
    },
    'an elevation was refused on reading': {
      context: context([row({ cells: { elevationM: unreadable('12000', 'outside-range') } })]),
      first: { severity: 'error', row: 2, field: 'elevationM' },
    },
    'a water depth is negative, with its mend': {
      context: context(rows({ waterDepthM: -4200 })),
      first: { field: 'waterDepthM', proposal: '4200' },
    },
  },
});
