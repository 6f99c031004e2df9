import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { humidityState } from './v66-humidity-state';

const sulfate = opticalDepth({ aerosolSpecies: 'sulfate' });

examplesOf(humidityState, {
  quiet: {
    'the species is dust': opticalDepth({}),
    'the method says ambient': { ...sulfate, metadata: { ...sulfate.metadata, method: 'ambient aerosol' } },
  },
  fires: {
    'nothing is said of sulfate': { context: sulfate, first: { severity: 'warning', field: 'method' } },
  },
});
