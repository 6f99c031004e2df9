import { READY_MADE_SETS } from '@siltlight/common/optics/ready-made-sets';
import { definitionOf } from '@siltlight/common/optics/species-optics';
import type { ParticleSet } from '@siltlight/common/optics/optical-set';
import { formOf, pathOf, readSpecies, startingDefinition, withMode, type SpeciesForm } from './species-form';

const start = formOf(startingDefinition);
const changed = (change: Partial<SpeciesForm['modes'][0]>): SpeciesForm => ({
  ...start,
  modes: [{ ...start.modes[0]!, ...change }],
});

test.each(
  READY_MADE_SETS.filter((set): set is ParticleSet => set.kind === 'particles').map((set) => [set.id, set]),
)('the ready-made set %s comes out of the form as it went in, to six figures', (_, set) => {
  const definition = definitionOf(set);
  const read = readSpecies(formOf(definition));
  expect(read).toHaveProperty('definition');
  if (!('definition' in read)) return;
  read.definition.modes.forEach((mode, at) => {
    expect(mode.medianRadiusUm / definition.modes[at]!.medianRadiusUm).toBeCloseTo(1, 5);
    expect(mode.numberFraction / definition.modes[at]!.numberFraction).toBeCloseTo(1, 4);
    expect(mode.index).toEqual(definition.modes[at]!.index);
  });
});

test('a number that cannot be read, or lies out of its range, is told at its field', () => {
  expect(readSpecies(changed({ medianRadiusUm: 'wide' }))).toEqual({
    faults: { 'modes.0.medianRadiusUm': expect.stringMatching(/not a number/) as string },
  });
  expect(readSpecies(changed({ geometricStdDev: '1' }))).toEqual({
    faults: { 'modes.0.geometricStdDev': expect.stringMatching(/1\.01 to 5/) as string },
  });
  expect(readSpecies({ ...start, kappa: '' })).toEqual({ faults: { kappa: 'Enter a number.' } });
});

test('counts of particles become shares', () => {
  const two = withMode(start);
  two.modes[0]!.numberFraction = '300';
  two.modes[1]!.numberFraction = '100';
  const read = readSpecies(two);
  expect('definition' in read && read.definition.modes.map((mode) => mode.numberFraction)).toEqual([
    0.75, 0.25,
  ]);
});

test('while modes share one index, the first one counts', () => {
  const two = withMode(start);
  two.modes[0] = {
    ...two.modes[0]!,
    index: { ...two.modes[0]!.index, kind: 'typed', real: '1.6', imaginary: '0' },
  };
  const shared = readSpecies(two);
  expect('definition' in shared && shared.definition.modes[1]!.index).toEqual({
    kind: 'typed',
    real: 1.6,
    imaginary: 0,
  });
  const apart = readSpecies({ ...two, oneIndex: false });
  expect('definition' in apart && apart.definition.modes[1]!.index.kind).toBe('material');
});

test('options that are switched off are null whatever their factor says', () => {
  const read = readSpecies({ ...start, coarse: false, coarseFactor: 'x', shape: true, shapeFactor: '1,3' });
  expect('definition' in read && [read.definition.coarseFactor, read.definition.shapeFactor]).toEqual([
    null,
    1.3,
  ]);
});

test('a field that the computation names is found in the form', () => {
  expect(pathOf('modes[1].maxRadiusUm')).toBe('modes.1.maxRadiusUm');
});
