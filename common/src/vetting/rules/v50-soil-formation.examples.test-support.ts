import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { soilFormation } from './v50-soil-formation';

const loess = (ageKaBp: number, remark: string | null = null) =>
  context(rows({ archive: 'loess', ageKaBp, remark }));

examplesOf(soilFormation, {
  quiet: { 'the loess is glacial': loess(21), 'the core is ice': context(rows({ ageKaBp: 5 })) },
  fires: {
    'the loess is of the last interglacial': { context: loess(125), first: { severity: 'warning', row: 2 } },
    'the row is remarked as a palaeosol': { context: loess(60, 'palaeosol'), first: { remedyKind: 'waive' } },
  },
});
