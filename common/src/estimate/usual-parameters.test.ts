import { expect, test } from 'vitest';
import { exampleEstimate } from '../../test/example-estimate';
import { distributionQuantile } from '../statistics/distributions';
import { runEstimate } from './run-estimate';
import { usualParameters, type UsualParametersInput } from './usual-parameters';

const usual: UsualParametersInput = {
  optics: {
    singleScatteringAlbedo: { low: 0.85, central: 0.9, high: 0.95 },
    asymmetry: { low: 0.65, central: 0.7, high: 0.76 },
    source: 'made up',
  },
  transmittance: 0.76,
  method: 'thin-layer-daily',
  longwaveEfficiencyWm2: 8,
};

test('the usual parameters of a formula run through an estimate and widen its interval', () => {
  const inputs = exampleEstimate();
  const parameters = usualParameters(usual);
  expect(parameters.map((p) => p.name)).toEqual([
    'singleScatteringAlbedo',
    'asymmetry',
    'transmittance',
    'surfaceAlbedoFactor',
    'cloudFractionFactor',
    'opticalDepthFactor',
    'longwaveEfficiencyWm2',
  ]);
  const width = (of: typeof parameters) => {
    const { low, high } = runEstimate({ ...inputs, ensemble: { ...inputs.ensemble, parameters: of } }).global
      .forcing.netWm2;
    return high - low;
  };
  expect(width(parameters)).toBeGreaterThan(width([]));
});

// 5, 8 and 11 W m⁻² in the parameter list, read as 5, 50 and 95 %
test('a range of the list moves with the central value of the run', () => {
  const of = (central: number) =>
    usualParameters({ ...usual, longwaveEfficiencyWm2: central }).at(-1)!.distribution;
  expect(distributionQuantile(of(8), 0.05)).toBeCloseTo(5, 10);
  expect(distributionQuantile(of(10), 0.95)).toBeCloseTo(13, 10);
});

test('an efficiency run varies the efficiency instead of the optics, and longwave off varies no longwave', () => {
  const names = usualParameters({ ...usual, method: 'efficiency', longwaveEfficiencyWm2: null }).map(
    (p) => p.name,
  );
  expect(names).toEqual(['shortwaveEfficiencyWm2', 'opticalDepthFactor']);
});

test('every source that was quoted from memory says so', () => {
  const air = usualParameters(usual).find((p) => p.name === 'transmittance')!;
  expect(air.source).toContain('from memory');
});
