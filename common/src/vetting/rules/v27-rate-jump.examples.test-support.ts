import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { rateJump } from './v27-rate-jump';

const rates = (...values: number[]) =>
  context(rows(...values.map((sedimentationRateCmKyr) => ({ sedimentationRateCmKyr }))));

examplesOf(rateJump, {
  quiet: { 'the rate changes fivefold': rates(2, 10, 2) },
  fires: {
    'the rate changes thirtyfold': {
      context: rates(2, 2, 60),
      first: { severity: 'warning', row: 4, field: 'sedimentationRateCmKyr', remedyKind: 'waive' },
    },
  },
});
