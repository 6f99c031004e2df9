import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { densityBasis } from './v30-density-basis';

const constant = rows(...Array.from({ length: 6 }, () => ({ densityGCm3: 1.5 })));
const stating = (basis: string | undefined) => ({ metadata: { ...answers, densityBasis: basis } });

examplesOf(densityBasis, {
  quiet: {
    'no density is given': context(rows({}), stating(undefined)),
    'densities are measured and differ': context(rows({ densityGCm3: 1.5 }, { densityGCm3: 1.4 })),
    'one density is assumed and said so': context(constant, stating('assumed')),
  },
  fires: {
    'nothing is said of the densities': {
      context: context(constant, stating(undefined)),
      first: { severity: 'warning', row: null, field: 'densityGCm3', remedyKind: 'answer' },
    },
    'six measured densities are all the same': { context: context(constant), first: { severity: 'warning' } },
  },
});
