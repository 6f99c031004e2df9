import { expect, test } from 'vitest';
import type { CsvRow } from '../../../reference/read';
import { checkTable, numberIn } from '../../test/check-table';
import { doublingSolver } from './adding-doubling';
import { addingDoubling } from './adding-doubling-scheme';
import { overSurface } from './lambertian-surface';
import type { LayerFluxes, LayerSolver } from './layer-scheme';
import { scatteringAngles } from './scattering-angles';

const SUNS = [0.1, 0.25, 0.5, 0.75, 1];
const ALBEDOS = ['0.1', '0.3', '0.6', '0.85'];

const solverOf = new Map<number, LayerSolver>();
const solvedRows = new Map<
  string,
  { reflectances: number[]; transmittances: number[]; diffuse: LayerFluxes }
>();

/** The layer of a row at all suns of the tables, solved once. */
function solvedOf(row: CsvRow) {
  const [tau, omega, g] = ['tau', 'omega', 'g'].map((column) => numberIn(row, column)) as [
    number,
    number,
    number,
  ];
  const key = `${tau} ${omega} ${g}`;
  if (!solverOf.has(g)) solverOf.set(g, addingDoubling.prepare(g, Float64Array.from(SUNS)));
  if (!solvedRows.has(key)) {
    const { reflectances, transmittances, diffuse } = solverOf.get(g)!(tau, omega);
    solvedRows.set(key, {
      reflectances: [...reflectances],
      transmittances: [...transmittances],
      diffuse: { ...diffuse },
    });
  }
  return solvedRows.get(key)!;
}

// Matrix-exponential doubling with 64 angles per hemisphere, 8 decimals of which 7 are to be trusted.
test('direct multi-stream equals the exact layer at every sun angle, over black and over grey ground', () => {
  for (const row of checkTable('optics/rt_exact_layer.csv')) {
    const { reflectances, transmittances, diffuse } = solvedOf(row);
    const at = SUNS.indexOf(numberIn(row, 'mu0'));
    const beam = { reflectance: reflectances[at]!, transmittance: transmittances[at]! };
    const distances = [
      beam.reflectance - numberIn(row, 'R_black_surface'),
      beam.transmittance - numberIn(row, 'T_direct') - numberIn(row, 'T_diffuse'),
      1 - beam.reflectance - beam.transmittance - numberIn(row, 'absorptance'),
      ...ALBEDOS.map(
        (albedo) =>
          overSurface(beam, diffuse, Number(albedo)).reflectance - numberIn(row, `toa_albedo_Rs${albedo}`),
      ),
    ];
    const distance = Math.max(...distances.map(Math.abs));
    expect(distance, JSON.stringify(row)).toBeLessThan(5e-7);
  }
});

test('direct multi-stream equals the exact layer under isotropic light, over black and over grey ground', () => {
  for (const row of checkTable('optics/rt_exact_diffuse.csv')) {
    const { diffuse } = solvedOf(row);
    const distances = [
      diffuse.reflectance - numberIn(row, 'R_isotropic_incidence'),
      diffuse.transmittance - numberIn(row, 'T_isotropic_incidence'),
      ...ALBEDOS.map(
        (albedo) =>
          overSurface(diffuse, diffuse, Number(albedo)).reflectance -
          numberIn(row, `mean_toa_albedo_Rs${albedo}`),
      ),
    ];
    const distance = Math.max(...distances.map(Math.abs));
    expect(distance, JSON.stringify(row)).toBeLessThan(5e-7);
  }
});

// Converged columns, 8 decimals; the published columns themselves have 16 streams and are not converged.
test('the published layers come out: isotropic thin and thick, Rayleigh, Henyey–Greenstein 0.75', () => {
  for (const row of checkTable('optics/rt_published.csv')) {
    const [name, g] = row.phase_function!.split(' ');
    const moments = Float64Array.from({ length: 97 }, (_, l) => {
      if (l === 0) return 1;
      if (name === 'HG') return Number(g) ** l;
      return name === 'Rayleigh' && l === 2 ? 0.1 : 0;
    });
    const mu = numberIn(row, 'mu0');
    const tau = numberIn(row, 'tau');
    const { reflectances, transmittances } = doublingSolver(scatteringAngles(moments, Float64Array.of(mu)))(
      tau,
      numberIn(row, 'omega'),
    );
    const diffuse = transmittances[0]! - Math.exp(-tau / mu);
    expect(Math.abs(reflectances[0]! - numberIn(row, 'R_exact_converged')), row.case).toBeLessThan(5e-7);
    expect(Math.abs(diffuse - numberIn(row, 'T_diffuse_exact_converged')), row.case).toBeLessThan(5e-7);
    expect(Math.abs(reflectances[0]! / numberIn(row, 'R_published_16_streams') - 1), row.case).toBeLessThan(
      1.1e-3,
    );
  }
});
