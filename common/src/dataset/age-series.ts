import { ageFields } from './age-fields';
import type { DatasetKind } from './field';

/**
 * Anything measured or dated along an age scale: isotope stacks, ion concentrations, ages of events. Each measured
 * column gives rows under its own name and in its own unit; nothing here is ever taken for dust.
 */
export const ageSeries: DatasetKind = {
  id: 'age-series',
  title: 'Record by age',
  valueField: 'seriesValue',
  sigmaField: 'seriesSigma',
  sigmas: { ageKaBp: 'ageSigmaKa' },
  usableWith: [['event', 'ageKaBp']],
  fields: [
    ...ageFields({
      ageSigmaKa: {
        headings: ['age sigma', 'age error', 'age uncertainty', 'sigma age', 'error of age', 'counting error', 'mce', 'maximum counting error', 'alter fehler', 'altersfehler'],
        help: 'One standard error; of a layer count half the maximum counting error, which is kept as given here.',
      },
    }),
    {
      field: 'event',
      title: 'Event',
      quantity: 'text',
      canonicalUnit: '',
      required: false,
      headings: ['event', 'events', 'stage', 'interstadial', 'name', 'label', 'ereignis', 'evenement', 'evento'],
      help: 'Name of a dated event, such as GI-1e.',
    },
    {
      field: 'seriesValue',
      title: 'Value',
      quantity: 'asGiven',
      canonicalUnit: '',
      required: false,
      headings: ['value', 'd18o', 'd18 o', 'benthic d18 o', 'delta 18o', 'd d', 'dd', 'fpp', 'laser fpp', 'coulter counter fpp', 'fine particle percentage', 'deuterium', 'deuterium excess', 'd13c', 'temperature', 'temperature anomaly', 'layer thickness', 'lt', 'na', 'ca', 'nh4', 'no3', 'so4', 'fe', 'wert', 'valeur', 'valor'],
      help: 'Kept in the unit of its column, under the name of its heading.',
    },
    {
      field: 'seriesSigma',
      title: 'Standard error of the value',
      quantity: 'asGiven',
      canonicalUnit: '',
      required: false,
      headings: ['value error', 'value sigma'],
      min: 0,
      help: 'One standard error, in the unit of the value.',
    },
  ],
}; // prettier-ignore
