/**
 * Reads the refractive-index files of optics/refractive-index/ as they were published. Three forms:
 * lines "wavelength [m], n, k" (with a humidity number at the end where there are several, of which 1 is dry),
 * lines "wavelength [µm] n k" inside YAML, and dispersion formulas, which are tabulated here.
 */
import { readFileSync } from 'node:fs';
import path from 'node:path';

const APACHE = 'Apache-2.0 (optics/refractive-index/LICENSE-ecaeropt.txt)';
const CC0 = 'CC0 1.0 (optics/refractive-index/LICENSE-refractiveindex-database.txt)';

const QUERRY_1987 =
  'Querry (1987), Optical constants of minerals and other materials from the millimeter to the ultraviolet, Contractor Report CRDEC-CR-88009';
const NO_VISIBLE = 'The table starts at 2.5 µm: it says nothing about visible light.';
const FORMULA =
  'From the dispersion formula, tabulated at 60 wavelengths; taken as transparent, the source gives no k.';

/** id, title, file, reader, source, licence, note */
const MATERIALS = [
  [
    'dust-woodward-2001',
    'Mineral dust, strongly absorbing',
    'du_ri_table_Woodward.txt',
    inMetres,
    'Woodward (2001), J. Geophys. Res. 106, 18155–18166',
    APACHE,
    '',
  ],
  [
    'dust-composite',
    'Mineral dust, composite of mineral species, weakly absorbing',
    'du_ri_table_composite.txt',
    inMetres,
    'twelve mineral species for 0.2–1 µm; Balkanski et al. (2007) for 1–3 µm; Di Biagio et al. (2017), Bodélé sample, for 3–15 µm',
    APACHE,
    'Sources as the first line of the file names them.',
  ],
  [
    'black-carbon-bond-2006',
    'Black carbon',
    'bc_ri_table_Bond_bergstrom.txt',
    inMetres,
    'Bond & Bergstrom (2006), Aerosol Sci. Technol. 40, 27–67 (page from memory)',
    APACHE,
    'One wavelength, 0.5 µm.',
  ],
  [
    'diesel-soot',
    'Diesel soot',
    'ri_other-soots-diesel-soot-nk-Querry-UMKC.yml',
    inMicrometres,
    QUERRY_1987,
    CC0,
    NO_VISIBLE,
  ],
  [
    'ammonium-sulfate',
    'Ammonium sulfate, dry',
    'su_ri_table.txt',
    inMetres,
    'data sets of the Global Aerosol Climatology Project, as the first line of the file names them',
    APACHE,
    'Dry values; the humid ones of the file are left out.',
  ],
  [
    'sea-salt',
    'Sea salt, dry',
    'ss_ri_table.txt',
    inMetres,
    'Hess, Koepke & Schult (1998), Bull. Am. Meteorol. Soc. 79, 831–844',
    APACHE,
    'Dry values; the humid ones of the file are left out.',
  ],
  ['sodium-chloride', 'Sodium chloride', 'ri_main-NaCl-nk-Querry.yml', inMicrometres, QUERRY_1987, CC0, ''],
  [
    'water',
    'Water at 25 °C',
    'ri_main-H2O-nk-Hale.yml',
    inMicrometres,
    'Hale & Querry (1973), Appl. Opt. 12, 555–563',
    CC0,
    '',
  ],
  [
    'hematite',
    'Hematite, ordinary ray',
    'ri_main-Fe2O3-nk-Querry-o.yml',
    inMicrometres,
    'Querry (1985), Optical constants, Contractor Report CRDC-CR-85034',
    CC0,
    'Rows of negative k (11, from 47.6 µm on) are left out: no mineral amplifies light.',
  ],
  ['illite', 'Illite', 'ri_other-clays-illite-nk-Querry.yml', inMicrometres, QUERRY_1987, CC0, NO_VISIBLE],
  [
    'kaolinite',
    'Kaolinite',
    'ri_other-clays-kaolinite-nk-Querry.yml',
    inMicrometres,
    QUERRY_1987,
    CC0,
    NO_VISIBLE,
  ],
  [
    'quartz',
    'Quartz, ordinary ray',
    'ri_main-SiO2-nk-Radhakrishnan-o.yml',
    (text) => byFormula(text, (poles) => poles.map(([strength, at]) => [strength, at * at])),
    'Radhakrishnan (1951), Proc. Indian Acad. Sci. 31, 22–34; (1947) 25, 260–265',
    CC0,
    FORMULA,
  ],
  [
    'calcite',
    'Calcite, ordinary ray',
    'ri_main-CaCO3-nk-Ghosh-o.yml',
    (text) => byFormula(text, (poles) => poles),
    'Ghosh (1999), Opt. Commun. 163, 95–102',
    CC0,
    FORMULA,
  ],
];

export function refractiveIndices() {
  const tables = MATERIALS.map(([id, title, file, read, source, licence, note]) => {
    const text = readFileSync(path.join(import.meta.dirname, 'optics', 'refractive-index', file), 'utf8');
    const rows = read(text)
      .filter(([, , k]) => k >= 0)
      .sort((a, b) => a[0] - b[0]);
    if (rows.length === 0) throw new Error(`${file} holds no rows`);
    const column = (i) => rows.map((row) => row[i]);
    return {
      id,
      title,
      source,
      licence,
      note,
      wavelengthsUm: column(0),
      real: column(1),
      imaginary: column(2),
    };
  });
  return `
    export interface RefractiveIndexTable {
      readonly id: string;
      readonly title: string;
      readonly source: string;
      readonly licence: string;
      readonly note: string;
      /** rising [µm, in air or vacuum] */
      readonly wavelengthsUm: readonly number[];
      /** n */
      readonly real: readonly number[];
      /** k of m = n − ik, 0 or more */
      readonly imaginary: readonly number[];
    }

    export const REFRACTIVE_INDICES: readonly RefractiveIndexTable[] = ${JSON.stringify(tables)};
  `;
}

const numbersOf = (line) => line.trim().split(/\s+/).map(Number);

function inMetres(text) {
  return text
    .split('\n')
    .slice(2)
    .filter((line) => line.trim() !== '')
    .map(numbersOf)
    .filter((row) => row.length < 5 || row[4] === 1)
    .map(([metres, n, k]) => [Number((metres * 1e6).toPrecision(8)), n, k]);
}

function inMicrometres(text) {
  return text
    .split('\n')
    .filter((line) => /^ {8}[\d.]/.test(line))
    .map(numbersOf);
}

/**
 * n² − 1 = c₁ + Σ B λ²/(λ² − C), λ in µm.
 *
 * @param squared makes [B, C] of the coefficient pairs: C is squared in one form of the formula and not in the other
 */
function byFormula(text, squared) {
  const [low, high] = numbersOf(/wavelength_range:(.*)/.exec(text)[1]);
  const [constant, ...rest] = numbersOf(/coefficients:(.*)/.exec(text)[1]);
  const pairs = rest.flatMap((value, i) => (i % 2 === 0 ? [[value, rest[i + 1]]] : []));
  const poles = squared(pairs);
  const count = 60;
  return Array.from({ length: count }, (_, i) => {
    const wavelength = Number((low * (high / low) ** (i / (count - 1))).toPrecision(6));
    const square = wavelength * wavelength;
    const n2 = poles.reduce((sum, [b, c]) => sum + (b * square) / (square - c), 1 + constant);
    return [wavelength, Number(Math.sqrt(n2).toPrecision(6)), 0];
  });
}
