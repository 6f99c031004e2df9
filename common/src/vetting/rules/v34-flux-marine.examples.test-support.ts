import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { fluxMarine } from './v34-flux-marine';

const flux = (fluxGM2Yr: number, latitudeDeg: number, longitudeDeg: number) =>
  context(rows({ fluxGM2Yr, latitudeDeg, longitudeDeg }), { metadata: { ...answers, archive: 'marine' } });

examplesOf(fluxMarine, {
  quiet: {
    'the Pacific gets 0.5': flux(0.5, 0, -140),
    'the sea off Mauritania gets 150': flux(150, 20, -19),
  },
  fires: {
    'the Pacific gets 150': { context: flux(150, 0, -140), first: { severity: 'warning', row: 2 } },
    'the Pacific gets a thousandth': { context: flux(0.0005, 0, 220), first: { severity: 'warning' } },
  },
});
