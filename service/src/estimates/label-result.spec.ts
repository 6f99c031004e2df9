import type { EstimateResult as Computed } from '@siltlight/common/estimate/estimate-result';
import { labelResult } from './label-result';

const computed = (longwave: object | null) =>
  ({
    outcomes: [-1, 0],
    cautions: [{ code: 'few-sites', message: 'few' }],
    record: {
      inputs: { slice: { name: 'Last Glacial Maximum' }, reference: { name: 'Pre-industrial' }, longwave },
      stepDeg: 2,
    },
  }) as unknown as Computed;

test('a result is labelled with level, sky, kind, both slices and the processes in it', () => {
  expect(labelResult(computed({ efficiencyWm2: 8, sky: 'all' })).label).toEqual({
    level: 'top of atmosphere',
    sky: 'all sky',
    kind: 'instantaneous, no rapid adjustments',
    sliceName: 'Last Glacial Maximum',
    referenceName: 'Pre-industrial',
    processes: 'dust alone, shortwave and longwave',
  });
  expect(labelResult(computed(null)).label.processes).toBe('dust alone, shortwave only');
});

test('numbers and cautions are handed on unchanged, and the inputs are not repeated in the result', () => {
  const result = labelResult(computed(null));
  expect(result).toMatchObject({ outcomes: [-1, 0], cautions: [{ code: 'few-sites' }] });
  expect(result).not.toHaveProperty('record');
});
