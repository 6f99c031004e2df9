import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { fewNeighbours } from './v59-few-neighbours';

const four = [10, 11, 12, 13].map((longitudeDeg) => ({
  site: `Core ${longitudeDeg}`,
  latitudeDeg: 75,
  longitudeDeg,
}));

examplesOf(fewNeighbours, {
  quiet: { 'four sites are neighbours': context(rows(...four)) },
  fires: {
    'a site stands alone': {
      context: context(rows({}, {})),
      first: { severity: 'note', sheet: null, remedyKind: 'none' },
    },
  },
});
