import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { CsvRow } from '../../../reference/read';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { massFractionBelow, radiusMoment, type LognormalMode } from './lognormal-mode';
import { mixtureMassFractionBelow, modeOptics, type OpticalMode } from './mode-optics';
import { PRECISIONS, scatterMode } from './mode-scattering';

function modeOf(row: CsvRow): OpticalMode {
  return {
    medianRadiusUm: numberIn(row, 'median_radius_um'),
    geometricStdDev: numberIn(row, 'sigma_g'),
    minRadiusUm: numberIn(row, 'rmin_um'),
    maxRadiusUm: numberIn(row, 'rmax_um'),
    numberFraction: row.number_fraction ? numberIn(row, 'number_fraction') : 1,
    densityGCm3: row.density_g_cm3 ? numberIn(row, 'density_g_cm3') : 1,
    refractiveIndex: { real: numberIn(row, 'n'), imaginary: numberIn(row, 'k') },
  };
}

/** 1e-4, the stated error; 5e-4 where nothing absorbs: its ripples are sharper. */
const toleranceOf = (modes: OpticalMode[]) =>
  modes.some((mode) => mode.refractiveIndex.imaginary > 0) ? 1e-4 : 5e-4;

test('the size-integrated optics of every mode of the table are met within the stated error', () => {
  for (const row of checkTable('optics/lognormal_modes.csv')) {
    const mode = modeOf(row);
    const optics = modeOptics([mode], numberIn(row, 'wavelength_um'));
    const label = `${row.mode} at ${row.wavelength_um} µm, k ${row.k}`;
    const tolerance = toleranceOf([mode]);
    expect(relativeError(optics.extinctionUm2, numberIn(row, 'Cext_um2_per_particle')), label).toBeLessThan(
      tolerance,
    );
    expect(relativeError(optics.singleScatteringAlbedo, numberIn(row, 'ssa')), label).toBeLessThan(tolerance);
    expect(relativeError(optics.asymmetry, numberIn(row, 'g')), label).toBeLessThan(tolerance);
    expect(relativeError(optics.massExtinctionM2PerG, numberIn(row, 'mee_m2_g')), label).toBeLessThan(
      tolerance,
    );
    expect(relativeError(optics.massAbsorptionM2PerG, numberIn(row, 'mae_m2_g')), label).toBeLessThan(
      tolerance,
    );
    // Closed forms: as good as the seven and six digits printed.
    expect(relativeError(optics.effectiveRadiusUm, numberIn(row, 'reff_um')), label).toBeLessThan(2e-6);
    expect(Math.abs(radiusMoment(mode, 0) - numberIn(row, 'number_fraction_inside_limits'))).toBeLessThan(
      2e-6, // the last printed digit, of limits that are themselves rounded
    );
  }
});

test('external mixtures of modes add up as the table says', () => {
  const groups = new Map<string, CsvRow[]>();
  for (const row of checkTable('optics/mixtures_external.csv')) {
    const key = `${row.mixture} at ${row.wavelength_um} µm`;
    groups.set(key, [...(groups.get(key) ?? []), row]);
  }
  expect(groups.size).toBe(9);
  for (const [label, rows] of groups) {
    const last = rows[rows.length - 1]!;
    const optics = modeOptics(rows.map(modeOf), numberIn(last, 'wavelength_um'));
    const pairs = [
      [optics.extinctionUm2, 'Cext_um2_per_particle_of_mixture'],
      [optics.singleScatteringAlbedo, 'ssa'],
      [optics.asymmetry, 'g'],
      [optics.effectiveRadiusUm, 'reff_um'],
      [optics.massExtinctionM2PerG, 'mee_m2_g'],
    ] as const;
    for (const [value, column] of pairs)
      expect(relativeError(value, numberIn(last, column)), `${column} of ${label}`).toBeLessThan(1e-4);
  }
});

// Published with 4, 4 and 3 digits: extinction within 0.1 %, ω 0.0007, g 0.0025, as checks/optics/SOURCES.md found.
test('the components of Hess et al. (1998) are reproduced within their printed digits', () => {
  for (const row of checkTable('optics/opac_components.csv')) {
    const optics = modeOptics([modeOf(row)], numberIn(row, 'wavelength_um'));
    const label = `${row.component} at ${row.wavelength_um} µm`;
    const perKm = optics.extinctionUm2 * 1e-3; // µm² cm⁻³ = 1e-6 m⁻¹ = 1e-3 km⁻¹
    expect(relativeError(perKm, numberIn(row, 'ext_computed')), label).toBeLessThan(1e-4);
    expect(Math.abs(optics.singleScatteringAlbedo - numberIn(row, 'ssa_computed')), label).toBeLessThan(1e-4);
    expect(Math.abs(optics.asymmetry - numberIn(row, 'g_computed')), label).toBeLessThan(1e-4);
    expect(relativeError(perKm, numberIn(row, 'ext_per_km_at_1_per_cm3_published')), label).toBeLessThan(
      1e-3,
    );
    expect(Math.abs(optics.singleScatteringAlbedo - numberIn(row, 'ssa_published')), label).toBeLessThan(
      7e-4,
    );
    expect(Math.abs(optics.asymmetry - numberIn(row, 'g_published')), label).toBeLessThan(2.5e-3);
  }
});

const coarse: OpticalMode = {
  medianRadiusUm: 2,
  geometricStdDev: 2.2,
  minRadiusUm: 0.01,
  maxRadiusUm: 100,
  numberFraction: 1,
  densityGCm3: 2.6,
  refractiveIndex: { real: 1.53, imaginary: 0.003 },
};

test('coarse dust to 100 µm at 0.3 µm keeps the stated error', () => {
  const close = modeOptics([coarse], 0.3);
  const exact = scatterMode(coarse, coarse.refractiveIndex, 0.3, 12800);
  const extinction = exact.scatteringUm2 + exact.absorptionUm2;
  expect(relativeError(close.extinctionUm2, extinction)).toBeLessThan(1e-4);
  expect(relativeError(close.singleScatteringAlbedo, exact.scatteringUm2 / extinction)).toBeLessThan(1e-4);
  expect(relativeError(close.asymmetry, exact.forwardUm2 / exact.scatteringUm2)).toBeLessThan(1e-4);
});

test('a weakly absorbing wide mode, the hardest kind, keeps the stated error', () => {
  const weak = {
    ...coarse,
    medianRadiusUm: 0.3,
    geometricStdDev: 2.5,
    refractiveIndex: { real: 1.53, imaginary: 0.0003 },
  };
  const close = modeOptics([weak], 0.55);
  const exact = scatterMode(weak, weak.refractiveIndex, 0.55, 25_600);
  const extinction = exact.scatteringUm2 + exact.absorptionUm2;
  expect(relativeError(close.extinctionUm2, extinction)).toBeLessThan(1e-4);
  expect(relativeError(close.singleScatteringAlbedo, exact.scatteringUm2 / extinction)).toBeLessThan(1e-4);
  expect(relativeError(close.asymmetry, exact.forwardUm2 / exact.scatteringUm2)).toBeLessThan(1e-4);
});

test('the fast setting stays within its stated error over the modes of the table', () => {
  for (const row of checkTable('optics/lognormal_modes.csv')) {
    const mode = modeOf(row);
    const optics = modeOptics([mode], numberIn(row, 'wavelength_um'), 'fast');
    const tolerance =
      mode.refractiveIndex.imaginary > 0
        ? PRECISIONS.fast.relativeError
        : PRECISIONS.fast.relativeErrorTransparent;
    const label = `${row.mode} at ${row.wavelength_um} µm, k ${row.k}`;
    expect(relativeError(optics.massExtinctionM2PerG, numberIn(row, 'mee_m2_g')), label).toBeLessThan(
      tolerance,
    );
    expect(relativeError(optics.singleScatteringAlbedo, numberIn(row, 'ssa')), label).toBeLessThan(tolerance);
    expect(relativeError(optics.asymmetry, numberIn(row, 'g')), label).toBeLessThan(tolerance);
  }
});

const anyMode: fc.Arbitrary<OpticalMode> = fc
  .record({
    medianRadiusUm: fc.double({ min: 0.02, max: 1, noNaN: true }),
    geometricStdDev: fc.double({ min: 1.3, max: 2.2, noNaN: true }),
    numberFraction: fc.double({ min: 0.01, max: 1, noNaN: true }),
    densityGCm3: fc.double({ min: 1, max: 3, noNaN: true }),
    real: fc.double({ min: 1.3, max: 2, noNaN: true }),
    imaginary: fc.oneof(fc.constant(0), fc.double({ min: 1e-6, max: 0.8, noNaN: true })),
  })
  .map(({ real, imaginary, ...rest }) => ({
    ...rest,
    minRadiusUm: 0.01,
    maxRadiusUm: 10,
    refractiveIndex: { real, imaginary },
  }));

test('the order of the modes changes nothing, and nothing absorbs where k is 0', () => {
  fc.assert(
    fc.property(fc.array(anyMode, { minLength: 1, maxLength: 4 }), (modes) => {
      const there = modeOptics(modes, 0.55, 'fast');
      const back = modeOptics([...modes].reverse(), 0.55, 'fast');
      for (const key of Object.keys(there) as (keyof typeof there)[])
        expect(relativeError(back[key], there[key])).toBeLessThan(1e-13);
      expect(there.singleScatteringAlbedo).toBeLessThanOrEqual(1);
      expect(there.singleScatteringAlbedo === 1).toBe(modes.every((m) => m.refractiveIndex.imaginary === 0));
    }),
    { numRuns: 60, seed: 5 },
  );
});

test('splitting a mode into two halves of its particles changes nothing', () => {
  const half = { ...coarse, numberFraction: 0.5 };
  const whole = modeOptics([coarse], 0.55, 'fast');
  const split = modeOptics([half, half], 0.55, 'fast');
  expect(split.massExtinctionM2PerG).toBeCloseTo(whole.massExtinctionM2PerG, 13);
  expect(split.asymmetry).toBeCloseTo(whole.asymmetry, 13);
});

test('moments and mass fractions follow the closed forms of an uncut lognormal', () => {
  const wide: LognormalMode = {
    ...coarse,
    medianRadiusUm: 0.5,
    geometricStdDev: 2,
    minRadiusUm: 1e-6,
    maxRadiusUm: 1e4,
  };
  const spread = Math.log(2);
  expect(radiusMoment(wide, 3) / radiusMoment(wide, 2)).toBeCloseTo(0.5 * Math.exp(2.5 * spread ** 2), 9);
  const massMedianDiameter = 2 * 0.5 * Math.exp(3 * spread ** 2);
  expect(massFractionBelow(wide, massMedianDiameter)).toBeCloseTo(0.5, 9);
  expect(massFractionBelow(wide, 0)).toBe(0);
  expect(massFractionBelow(wide, 2e4)).toBe(1);
  const modes = [coarse, { ...coarse, medianRadiusUm: 0.3, numberFraction: 0.5 }];
  expect(mixtureMassFractionBelow(modes, 200)).toBe(1);
  expect(mixtureMassFractionBelow(modes, 5)).toBeGreaterThan(massFractionBelow(coarse, 5));
});

test('a mode that cannot be is refused by the name of its field', () => {
  const wrong = (change: Partial<OpticalMode>) => () => modeOptics([coarse, { ...coarse, ...change }], 0.55);
  expect(wrong({ geometricStdDev: 1 })).toThrow(
    'modes[1].geometricStdDev is 1; it must lie within 1.01 to 5',
  );
  expect(wrong({ maxRadiusUm: 0.01 })).toThrow('modes[1].maxRadiusUm');
  expect(wrong({ densityGCm3: 0 })).toThrow('modes[1].densityGCm3');
  expect(wrong({ numberFraction: NaN })).toThrow('modes[1].numberFraction');
  expect(wrong({ medianRadiusUm: 0.001, minRadiusUm: 50, maxRadiusUm: 60 })).toThrow('modes[1].minRadiusUm');
  expect(wrong({ refractiveIndex: { real: 0, imaginary: 0 } })).toThrow('modes[1].refractiveIndex.real');
  expect(() => modeOptics([], 0.55)).toThrow('modes is 0');
  expect(() => modeOptics([coarse], 0)).toThrow('wavelengthUm');
  expect(() => modeOptics([{ ...coarse, numberFraction: 0 }], 1)).toThrow('above 0 in at least one mode');
});
