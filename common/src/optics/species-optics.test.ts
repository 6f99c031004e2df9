import { expect, test } from 'vitest';
import { opticsOfSet, type ParticleSet } from './optical-set';
import { READY_MADE_SETS } from './ready-made-sets';
import { definitionOf, scatteringModes, speciesOptics, speciesRange } from './species-optics';

const set = (id: string) => READY_MADE_SETS.find((one) => one.id === id) as ParticleSet;
const transported = definitionOf(set('dust-transported'));

test.each(['dust-pm20-desert', 'sulfate', 'black-carbon'])(
  'the definition of the ready-made set %s gives the optics of the set',
  (id) => {
    const optics = opticsOfSet(set(id), 0.55, 'fast');
    const { cautions, ...values } = speciesOptics(definitionOf(set(id)), 0.55, 'fast');
    const { cautions: expected, ...known } = optics;
    expect(values).toEqual(known);
    expect(cautions).toEqual(expected.filter(({ code }) => code !== 'spheres'));
  },
);

test('coarse addition lowers extinction per mass and is named, shape raises it by its factor and is named', () => {
  const plain = speciesOptics(transported, 0.55, 'fast');
  const coarse = speciesOptics({ ...transported, coarseFactor: 4 }, 0.55, 'fast');
  expect(coarse.massExtinctionM2PerG).toBeLessThan(plain.massExtinctionM2PerG);
  expect(coarse.cautions.map(({ code }) => code)).toContain('coarse-dust-added');
  const shaped = speciesOptics({ ...transported, shapeFactor: 1.3 }, 0.55, 'fast');
  expect(shaped.massExtinctionM2PerG).toBeCloseTo(1.3 * plain.massExtinctionM2PerG, 12);
  expect(shaped.cautions.map(({ code }) => code)).toContain('non-sphericity-applied');
});

test('a mixture of one mineral alone is the mineral', () => {
  const modesOf = (index: (typeof transported.modes)[0]['index']) => ({
    ...transported,
    modes: transported.modes.map((mode) => ({ ...mode, index })),
  });
  const alone = speciesOptics(modesOf({ kind: 'material', material: 'quartz' }), 0.6, 'fast');
  const mixed = speciesOptics(
    modesOf({
      kind: 'mixture',
      rule: 'bruggeman',
      parts: [
        { material: 'quartz', volumeFraction: 1 },
        { material: 'hematite', volumeFraction: 0 },
      ],
    }),
    0.6,
    'fast',
  );
  expect(mixed.singleScatteringAlbedo).toBeCloseTo(alone.singleScatteringAlbedo, 12);
});

test('the range holds the central value, is nothing without spread, and widens with it', () => {
  const central = speciesOptics(transported, 0.55, 'fast');
  const none = { ...transported, spread: { radiusFactor: 1, absorptionFactor: 1 } };
  const still = speciesRange(none, 0.55, central).singleScatteringAlbedo;
  expect(still.high - still.low).toBeLessThan(1e-12);
  const wide = speciesRange(transported, 0.55, central);
  for (const name of ['massExtinctionM2PerG', 'singleScatteringAlbedo', 'asymmetry'] as const) {
    expect(wide[name].low).toBeLessThan(central[name]);
    expect(wide[name].high).toBeGreaterThan(central[name]);
  }
  // Smaller spheres of the same mass take more from the light: the range follows the radii.
  expect(wide.massExtinctionM2PerG.high / central.massExtinctionM2PerG).toBeGreaterThan(1.1);
});

test('what scatters has taken up its water', () => {
  const sulfate = definitionOf(set('sulfate'));
  expect(scatteringModes(sulfate, 0.55)[0]!.medianRadiusUm).toBeGreaterThan(sulfate.modes[0]!.medianRadiusUm);
});

test('a mode that cannot be is refused by its path', () => {
  const broken = {
    ...transported,
    modes: [...transported.modes, { ...transported.modes[0]!, medianRadiusUm: 0 }],
  };
  expect(() => speciesOptics(broken, 0.55)).toThrow(/modes\[1\]\.medianRadiusUm is 0 µm/);
});
