import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { datasetKind } from '../dataset/kinds';
import { textWorkbook } from './fixtures.test-support';
import { normaliseWorkbook } from './normalise';
import { proposeWorkbook } from './propose';

const dust = datasetKind('dust-flux');
const read = (text: string, delimiter: string) => {
  const workbook = textWorkbook(text, delimiter);
  return normaliseWorkbook(workbook, dust, proposeWorkbook(workbook, dust)).rows;
};

/** How one file writes its numbers. Delimiters that are also decimal or thousands signs would need quotes: not paired. */
const style = fc.constantFrom(
  ...[';', '\t', '|'].flatMap((delimiter) =>
    (
      [
        ['.', ''],
        ['.', ','],
        ['.', ' '],
        ['.', "'"],
        [',', ''],
        [',', '.'],
        [',', ' '],
        [',', '\u00a0'],
        [',', '\u202f'],
      ] as const
    ).map(([decimal, thousands]) => ({ delimiter, decimal, thousands })),
  ),
  { delimiter: ',', decimal: '.', thousands: '' },
  { delimiter: ',', decimal: '.', thousands: ' ' },
);
type Style = { delimiter: string; decimal: string; thousands: string };

function written(value: number, decimals: number, { decimal, thousands }: Style, minus = '-'): string {
  const [whole = '', fraction] = Math.abs(value).toFixed(decimals).split('.');
  const grouped = thousands === '' ? whole : whole.replace(/\B(?=(\d{3})+$)/g, thousands);
  return `${value < 0 ? minus : ''}${grouped}${fraction === undefined ? '' : decimal + fraction}`;
}

const line = fc.record({
  lat: fc.integer({ min: -8999, max: 8999 }).map((n) => n / 100),
  lon: fc.integer({ min: -17999, max: 17999 }).map((n) => n / 100),
  years: fc.integer({ min: 1000, max: 900_000 }),
  flux: fc.integer({ min: 1, max: 9_999_999 }).map((n) => n / 100),
  sigma: fc.integer({ min: 1, max: 9999 }).map((n) => n / 100),
});
const lines = fc.array(line, { minLength: 3, maxLength: 12 });

/** 12 digits are kept of a converted value. */
const close = (got: number | null, wanted: number): boolean =>
  got !== null && Math.abs(got - wanted) <= 1e-11 * Math.max(1, Math.abs(wanted));

describe('a random table written in any text format is read back as it was', () => {
  test('whatever delimiter, decimal sign, thousands sign and minus', () => {
    fc.assert(
      fc.property(lines, style, fc.constantFrom('-', '−', '–'), (table, how, minus) => {
        const head = [
          'Site',
          'Latitude',
          'Longitude',
          'Age (yr BP)',
          'Dust flux (mg m-2 yr-1)',
          'Error',
        ].join(how.delimiter);
        const body = table.map(({ lat, lon, years, flux, sigma }) =>
          [
            ...['Core A', written(lat, 2, how, minus), written(lon, 2, how, minus)],
            ...[String(years), written(flux, 2, how), written(sigma, 2, how)],
          ].join(how.delimiter),
        );
        const rows = read([head, ...body].join('\n'), how.delimiter);
        expect(rows).toHaveLength(table.length);
        for (const [i, wanted] of table.entries()) {
          const row = rows[i]!;
          const said = JSON.stringify({ wanted, line: body[i], cells: row.cells });
          expect(row.latitudeDeg, said).toBe(wanted.lat === 0 ? 0 : wanted.lat);
          expect(row.longitudeDeg, said).toBe(wanted.lon === 0 ? 0 : wanted.lon);
          expect(close(row.ageKaBp, wanted.years / 1000), said).toBe(true);
          expect(close(row.fluxGM2Yr, wanted.flux / 1000), said).toBe(true);
          expect(close(row.fluxSigmaGM2Yr, wanted.sigma / 1000), said).toBe(true);
        }
      }),
      { numRuns: 150, seed: 11 },
    );
  });

  const mark = fc.constantFrom('*', '†', '‡', '¹', ' *', '#');
  const cell = fc.oneof(
    fc.record({ kind: fc.constant('plain' as const), mark: fc.constant('') }),
    fc.record({ kind: fc.constant('footnote' as const), mark }),
    fc.record({
      kind: fc.constantFrom(
        'below' as const,
        'below-spaced' as const,
        'plus-minus' as const,
        'glued' as const,
        'ascii' as const,
        'power' as const,
        'unit' as const,
        'words' as const,
        'missing' as const,
      ),
      mark: fc.constant(''),
    }),
  );

  test('whether a cell has a footnote, a limit, an uncertainty, a power of ten or a unit of its own', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(line, cell), { minLength: 4, maxLength: 12 }),
        fc.constantFrom('.', ','),
        (table, decimal) => {
          const how = { delimiter: ';', decimal, thousands: '' };
          const text = (
            { flux, sigma }: { flux: number; sigma: number },
            { kind, mark: sign }: { kind: string; mark: string },
          ): string => {
            const [value, spread] = [written(flux, 2, how), written(sigma, 2, how)];
            const spellings: Record<string, string> = {
              footnote: `${value}${sign}`,
              below: `<${value}`,
              'below-spaced': `< ${value}`,
              'plus-minus': `${value} ± ${spread}`,
              glued: `${value}±${spread}`,
              ascii: `${value} +/- ${spread}`,
              power: `${written(flux / 10, 3, how)} x 10^1`,
              unit: `${written(flux / 1000, 5, how)} g m-2 yr-1`,
              words: 'below detection',
              missing: '-999',
            };
            return spellings[kind] ?? value;
          };
          const head = 'Site;Latitude;Longitude;Age (yr BP);Dust flux (mg m-2 yr-1)';
          // The first line is plain, so that the column always shows its decimal sign.
          const body = [
            `Core A;${written(1.25, 2, how)};${written(2.25, 2, how)};1000;${written(1.5, 2, how)}`,
          ].concat(
            table.map(
              ([one, as]) =>
                `Core A;${written(one.lat, 2, how)};${written(one.lon, 2, how)};${one.years};${text(one, as)}`,
            ),
          );
          const rows = read([head, ...body].join('\n'), ';').slice(1);
          expect(rows).toHaveLength(table.length);
          for (const [i, [wanted, { kind }]] of table.entries()) {
            const row = rows[i]!;
            const traced = row.cells.fluxGM2Yr!;
            const said = `${body[i + 1]} → ${JSON.stringify(traced)}`;
            const isBelow = kind.startsWith('below') || kind === 'words';
            expect(traced.belowDetection === true, said).toBe(isBelow);
            if (kind === 'missing' || isBelow) expect(row.fluxGM2Yr, said).toBeNull();
            else expect(close(row.fluxGM2Yr, wanted.flux / 1000), said).toBe(true);
            if (kind.startsWith('below'))
              expect(close(traced.value as number, wanted.flux / 1000), said).toBe(true);
            const hasSpread = ['plus-minus', 'glued', 'ascii'].includes(kind);
            if (hasSpread) expect(close(row.fluxSigmaGM2Yr, wanted.sigma / 1000), said).toBe(true);
            else expect(row.fluxSigmaGM2Yr, said).toBeNull();
            expect(traced.raw).toBe(body[i + 1]!.split(';')[4]);
          }
        },
      ),
      { numRuns: 150, seed: 12 },
    );
  });

  const angle = (degrees: number) =>
    fc.record({
      degrees: fc.integer({ min: 0, max: degrees - 1 }),
      minutes: fc.integer({ min: 0, max: 59 }),
      seconds: fc.integer({ min: 0, max: 59 }),
      negative: fc.boolean(),
    });
  type Angle = { degrees: number; minutes: number; seconds: number; negative: boolean };
  const two = (n: number): string => String(n).padStart(2, '0');
  const spellings = fc.constantFrom<((a: Angle, letter: string) => string)[]>(
    (a, letter) => `${a.degrees}°${two(a.minutes)}'${two(a.seconds)}"${letter}`,
    (a, letter) => `${a.degrees}° ${a.minutes}′ ${a.seconds}″ ${letter}`,
    (a, letter) => `${a.degrees} ${two(a.minutes)} ${two(a.seconds)} ${letter}`,
    (a, letter) => `${a.degrees}:${two(a.minutes)}:${two(a.seconds)}${letter}`,
    (a, letter) => `${letter}${a.degrees}:${two(a.minutes)}:${two(a.seconds)}`,
    (a, letter) => `${a.degrees}d${two(a.minutes)}m${two(a.seconds)}s ${letter}`,
    (a, letter) => `${a.degrees}º${two(a.minutes)}’${two(a.seconds)}” ${letter}`,
  );

  test('whether positions are in degrees, minutes and seconds of whatever spelling', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(angle(90), angle(180)), { minLength: 2, maxLength: 8 }),
        spellings,
        (table, spell) => {
          const head = 'Site;Latitude;Longitude;Age (ka BP);Dust flux (g m-2 yr-1)';
          const body = table.map(
            ([lat, lon], i) =>
              `Core A;${spell(lat, lat.negative ? 'S' : 'N')};${spell(lon, lon.negative ? 'W' : 'E')};${i + 1.5};0.5`,
          );
          const rows = read([head, ...body].join('\n'), ';');
          for (const [i, [lat, lon]] of table.entries()) {
            for (const [angleOf, got] of [
              [lat, rows[i]!.latitudeDeg],
              [lon, rows[i]!.longitudeDeg],
            ] as const) {
              const size = angleOf.degrees + angleOf.minutes / 60 + angleOf.seconds / 3600;
              // Positions are kept to 1e-9°, a tenth of a millimetre.
              expect(
                Math.abs((got ?? NaN) - (angleOf.negative ? -size : size)),
                `${body[i]}: ${got}`,
              ).toBeLessThan(1e-9);
            }
          }
        },
      ),
      { numRuns: 120, seed: 13 },
    );
  });
});
