import { expect, test } from 'vitest';
import { bandOptics, shortwaveWeights } from './broadband';
import { opticsOfSet, parameterRow, type ParticleSet } from './optical-set';
import { READY_MADE_SETS } from './ready-made-sets';

const particleSets = READY_MADE_SETS.filter((set): set is ParticleSet => set.kind === 'particles');

test.each(particleSets.map((set) => [set.title, set] as const))(
  '%s, recomputed, lies within the published intervals or says why not',
  (_, set) => {
    const optics = opticsOfSet(set, 0.55);
    const { massExtinction, singleScatteringAlbedo, asymmetry, massRatio = 1 } = set.heldAgainst;
    const held = [
      ['massExtinctionM2PerG', optics.massExtinctionM2PerG * massRatio, massExtinction],
      ['singleScatteringAlbedo', optics.singleScatteringAlbedo, singleScatteringAlbedo],
      ['asymmetry', optics.asymmetry, asymmetry],
    ] as const;
    const outside = held
      .filter(([, value, id]) => value < parameterRow(id).low || value > parameterRow(id).high)
      .map(([quantity]) => quantity);
    expect(outside).toEqual(set.outside.map((entry) => entry.quantity));
    for (const { reason } of set.outside) expect(reason.length).toBeGreaterThan(20);
  },
);

test('every set has its own id, a source and stated evidence', () => {
  expect(new Set(READY_MADE_SETS.map((set) => set.id)).size).toBe(READY_MADE_SETS.length);
  for (const set of READY_MADE_SETS) {
    expect(set.source, set.id).not.toBe('');
    expect(set.evidence, set.id).toMatch(/read|seen|from memory|assum/);
    if (set.kind === 'bulk') {
      for (const { low, central, high } of [
        set.massExtinctionM2PerG,
        set.singleScatteringAlbedo,
        set.asymmetry,
      ]) {
        expect(low).toBeLessThanOrEqual(central);
        expect(central).toBeLessThanOrEqual(high);
      }
      expect(opticsOfSet(set, 0.55).cautions).toEqual([]);
      expect(opticsOfSet(set, 1).cautions[0]!.code).toBe('bulk-at-550-nm');
    }
  }
});

test('dust comes fine and coarse, weakly and strongly absorbing', () => {
  const at = (id: string) =>
    opticsOfSet(
      READY_MADE_SETS.find((set) => set.id === id)!,
      0.55,
    );
  const [fine, coarse] = [at('dust-fine'), at('dust-coarse')];
  expect(fine.massExtinctionM2PerG).toBeGreaterThan(2 * coarse.massExtinctionM2PerG);
  expect(fine.singleScatteringAlbedo).toBeGreaterThan(coarse.singleScatteringAlbedo);
  expect(at('dust-pm10-high-absorption').singleScatteringAlbedo).toBeLessThan(
    at('dust-pm10-low-absorption').singleScatteringAlbedo - 0.03,
  );
  expect(fine.cautions.map((caution) => caution.code)).toEqual(['spheres']);
  expect(at('black-carbon').cautions.map((caution) => caution.code)).toEqual(['index-extrapolated']);
});

test('the shortwave mean of a dust set lies among its spectral values', () => {
  const dust = READY_MADE_SETS.find((set) => set.id === 'dust-pm10-low-absorption')!;
  const band = bandOptics((wavelength) => opticsOfSet(dust, wavelength, 'fast'), shortwaveWeights());
  const green = opticsOfSet(dust, 0.55, 'fast');
  // Absorption per extinction is highest in the ultraviolet and lowest in the near infrared.
  expect(band.singleScatteringAlbedo).toBeGreaterThan(opticsOfSet(dust, 0.35, 'fast').singleScatteringAlbedo);
  expect(band.singleScatteringAlbedo).toBeLessThan(opticsOfSet(dust, 1.5, 'fast').singleScatteringAlbedo);
  expect(Math.abs(band.massExtinctionM2PerG / green.massExtinctionM2PerG - 1)).toBeLessThan(0.1);
  expect(band.basis).toContain('Planck');
});
