import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { fluxPeatLake } from './v36-flux-peat-lake';

const of = (archive: string, fluxGM2Yr: number) => context(rows({ archive, fluxGM2Yr }));

examplesOf(fluxPeatLake, {
  quiet: { 'a bog gains 3': of('peat bog', 3), 'ice gains next to nothing': of('ice core', 0.001) },
  fires: {
    'a lake gains 900': { context: of('lake sediment', 900), first: { severity: 'warning', row: 2 } },
    'a bog gains 0.001': { context: of('Torf', 0.001), first: { severity: 'warning', remedyKind: 'waive' } },
  },
});
