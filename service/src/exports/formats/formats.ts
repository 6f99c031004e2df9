import type { ExportFormat } from '@siltlight/common/wire/exports';
import type { ExportSubject } from '../export-subject';
import { regionalTableCsv } from './regional-table';
import { sliceFieldsNetcdf } from './slice-fields';

/** How each format is made; a further one is an entry here. */
export const FORMATS: Record<
  ExportFormat,
  { mediaType: string; suffix: string; title: string; make: (subject: ExportSubject) => Buffer }
> = {
  'regional-table-csv': {
    mediaType: 'text/csv; charset=utf-8',
    suffix: 'regions.csv',
    title: 'regional table, CSV',
    make: (subject) => Buffer.from(regionalTableCsv(subject), 'utf8'),
  },
  'slice-fields-netcdf': {
    mediaType: 'application/netcdf',
    suffix: 'fields.nc',
    title: 'slice fields, NetCDF',
    make: sliceFieldsNetcdf,
  },
};
