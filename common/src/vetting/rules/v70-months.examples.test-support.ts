import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { months } from './v70-months';

const dates = (...given: string[]) => opticalDepth(...given.map((date) => ({ date })));
const june = dates('01:06:2000', '02:06:2000', '2000-07-01');

examplesOf(months, {
  quiet: {
    'all months are there': dates(
      ...Array.from({ length: 12 }, (_, i) => `2001-${String(i + 1).padStart(2, '0')}`),
    ),
    'only years are given': dates('2001', '2002'),
    'the season is stated': { ...june, metadata: { ...june.metadata, method: 'summer means' } },
  },
  fires: {
    'a site has two months': {
      context: june,
      first: { severity: 'warning', row: 2, field: 'date', remedyKind: 'answer' },
    },
  },
});
