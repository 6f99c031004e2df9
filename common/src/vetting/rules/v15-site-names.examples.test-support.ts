import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { siteNames } from './v15-site-names';

const at = (site: string, latitudeDeg: number, longitudeDeg: number) => ({ site, latitudeDeg, longitudeDeg });
const held = {
  site: 'Old Core',
  latitudeDeg: -75.1,
  longitudeDeg: 123.351,
  datasetTitle: 'Earlier',
  archive: 'ice',
};

examplesOf(siteNames, {
  quiet: {
    'one core keeps name and position': context(rows({}, {}, {})),
    'its longitude is once counted to 360': context(rows(at('B', 10, -42.32), at('B', 10, 317.68))),
    'two cores are apart': context(rows(at('A', 10, 20), at('B', 11, 20))),
  },
  fires: {
    'one name stands at two places': {
      context: context(rows(at('Core-B', 10, 20), at('core b', 12, 20))),
      first: { severity: 'warning', row: 3, remedyKind: 'waive' },
    },
    'two names stand at one place across the date line': {
      context: context(rows(at('A', 10, 179.998), at('B', 10, -179.998))),
      first: { severity: 'warning', row: 3 },
    },
    'Holdings know the place under another name': {
      context: context(rows({}), { heldSites: [held] }),
      first: { row: 2, field: 'site' },
    },
  },
});
