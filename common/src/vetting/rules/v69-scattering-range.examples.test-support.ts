import { examplesOf } from './examples.test-support';
import { opticalDepth, unreadable } from './rows.test-support';
import { scatteringRange } from './v69-scattering-range';

examplesOf(scatteringRange, {
  quiet: {
    'dust scatters nearly all': opticalDepth({ singleScatteringAlbedo: 0.94, asymmetry: 0.72 }),
    'soot scatters little': opticalDepth({ singleScatteringAlbedo: 0.25, aerosolSpecies: 'black carbon' }),
  },
  fires: {
    'dust scatters as little as soot': {
      context: opticalDepth({ singleScatteringAlbedo: 0.25 }),
      first: { severity: 'error', row: 2, field: 'singleScatteringAlbedo', remedyKind: 'mend' },
    },
    'the asymmetry is negative': {
      context: opticalDepth({ asymmetry: -0.2 }),
      first: { row: 2, field: 'asymmetry' },
    },
    'an albedo was refused on reading': {
      context: opticalDepth({ cells: { singleScatteringAlbedo: unreadable('1.4', 'outside-range') } }),
      first: { row: 2, field: 'singleScatteringAlbedo' },
    },
  },
});
