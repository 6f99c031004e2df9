import type { DatasetKind } from './field';
import { PLACE_FIELDS } from './place-fields';

/** A value on a grid of latitude and longitude, one row a cell or as a matrix. Its unit is kept as the file gives it. */
export const griddedField: DatasetKind = {
  id: 'gridded-field',
  title: 'Gridded field',
  valueField: 'gridValue',
  sigmaField: 'gridSigma',
  fields: [
    ...PLACE_FIELDS.filter(({ field }) => field === 'latitudeDeg' || field === 'longitudeDeg'),
    {
      field: 'month',
      title: 'Month',
      quantity: 'month',
      canonicalUnit: '',
      required: false,
      headings: ['month', 'months', 'monat', 'mois', 'mes', 'mese', 'mon'],
      min: 1,
      max: 12,
      help: '1 to 12 or a name; empty or "annual" for the mean of the year.',
    },
    {
      field: 'gridValue',
      title: 'Value',
      quantity: 'asGiven',
      canonicalUnit: '',
      required: true,
      headings: ['value', 'values', 'dust deposition', 'deposition', 'dust flux', 'flux', 'dust load', 'load', 'burden', 'aod', 'dust aod', 'dod', 'optical depth', 'dust optical depth', 'aerosol optical depth', 'albedo', 'surface albedo', 'cloud fraction', 'wert', 'valeur', 'valor', 'z'],
      help: 'Of the cell whose middle the row names; what it is of is told by its heading.',
    },
    {
      field: 'gridSigma',
      title: 'Standard error of the value',
      quantity: 'asGiven',
      canonicalUnit: '',
      required: false,
      headings: ['value error', 'value sigma', 'value uncertainty', 'fehler'],
      min: 0,
      help: 'One standard error, in the unit of the value.',
    },
  ],
}; // prettier-ignore
