import fc from 'fast-check';
import { expect, test } from 'vitest';
import { answers, context, row, rows, unreadable } from './rules/rows.test-support';
import type { SubmissionMetadata } from './context';
import { neighbouredSites } from './neighbours';
import { rules } from './rules/index';
import { counts, vet } from './vet';

const faulty = context(
  rows(
    { fluxGM2Yr: -1 },
    { latitudeDeg: 95 },
    { fluxGM2Yr: null, cells: { fluxGM2Yr: unreadable('about 3') } },
    { fluxGM2Yr: null },
  ),
  { metadata: { ...answers, licence: undefined } },
);

test('findings come in reading order: file, sheet, row, column', () => {
  const findings = vet(faulty);
  const places = findings.map(({ sheet, row: at }) => (sheet === null ? -1 : (at ?? 0)));
  expect(places).toEqual([...places].sort((a, b) => a - b));
  const errors = findings.filter(({ severity }) => severity === 'error');
  expect(errors.map(({ code, row: at }) => `${code} ${at}`)).toEqual(['V79 null', 'V32 2', 'V09 3', 'V03 4']);
});

test('the same context gives the same findings with the same keys, all different and short', () => {
  const keys = vet(faulty).map(({ key }) => key);
  expect(vet(structuredClone(faulty)).map(({ key }) => key)).toEqual(keys);
  expect(new Set(keys).size).toBe(keys.length);
  for (const key of keys) expect(key.length).toBeLessThanOrEqual(500);
});

test('a key stays when other rows change and ends when its own cell is mended', () => {
  const keyOfRow2 = (changes: Parameters<typeof rows>) =>
    vet(context(rows(...changes)), { rules: rules.filter(({ id }) => id === 'V33') })[0]?.key;
  const before = keyOfRow2([{ fluxGM2Yr: 0.5 }, {}]);
  expect(before).toBeDefined();
  expect(keyOfRow2([{ fluxGM2Yr: 0.5 }, { fluxGM2Yr: 0.02 }])).toBe(before);
  expect(keyOfRow2([{ fluxGM2Yr: 0.6 }, {}])).not.toBe(before);
});

test('left-out rows are seen by no rule and counted', () => {
  const settled = {
    ...faulty,
    rows: faulty.rows.map((one) => (one.row === 5 ? one : { ...one, leftOut: 'trial' })),
  };
  const findings = vet(settled);
  expect(findings.filter(({ row: at }) => at !== null && at < 5)).toEqual([]);
  expect(counts(settled, findings)).toMatchObject({ rows: 4, leftOut: 3, withoutValue: 1 });
});

test('only the wanted stages run', () => {
  expect(vet(faulty, { stages: ['file'] }).map(({ code }) => code)).not.toContain('V79');
  expect(vet(faulty, { stages: ['field', 'grid', 'export'] })).toEqual([]);
});

test('a file checked without a form is not blocked by what only the form can answer', () => {
  const findings = vet(context(rows({}), { metadata: {}, formOffered: false }));
  expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  const asked = findings.filter(({ remedyKind }) => remedyKind === 'answer').map(({ code }) => code);
  expect(asked).toEqual(expect.arrayContaining(['V05', 'V41', 'V51', 'V79']));
});

test('a rule that breaks is reported under its own id and hides nothing else', () => {
  const broken = {
    ...rules[0]!,
    check: () => {
      throw new Error('out of order');
    },
  };
  const findings = vet(faulty, { rules: [broken, ...rules.slice(1)] });
  expect(findings.find(({ code }) => code === 'V01')).toMatchObject({
    severity: 'warning',
    remedyKind: 'waive',
  });
  expect(findings.map(({ code }) => code)).toContain('V32');
});

test('no rule breaks on odd numbers and texts', () => {
  const number = fc.option(fc.oneof(fc.double(), fc.constantFrom(0, -0, 1e308, -1e-320)), { nil: null });
  const text = fc.option(fc.oneof(fc.string({ unit: 'binary' }), fc.constantFrom('', '<', 'bulk', '.')), {
    nil: null,
  });
  const odd = fc.record({
    site: text,
    latitudeDeg: number,
    longitudeDeg: number,
    archive: text,
    ageKaBp: number,
    ageYoungKaBp: number,
    depthM: number,
    depthTopM: number,
    depthBaseM: number,
    fluxGM2Yr: number,
    fluxSigmaGM2Yr: number,
    sizeCutoff: text,
    densityGCm3: number,
    sedimentationRateCmKyr: number,
    dustFraction: number,
    elevationM: number,
    remark: text,
  });
  const word = fc.option(fc.string(), { nil: undefined });
  const metadata: fc.Arbitrary<SubmissionMetadata> = fc.record({
    archive: fc.constantFrom('ice', 'marine', 'loess', 'lake', 'peat', 'other', undefined),
    licence: word,
    publicationDoi: word,
    ageModel: word,
    method: word,
    sizeCutoff: word,
  });
  fc.assert(
    fc.property(fc.array(odd, { maxLength: 8 }), metadata, (samples, form) => {
      const findings = vet(context(samples.length ? rows(...samples) : [row()], { metadata: form }));
      expect(findings.filter(({ key }) => key.includes('rule-broke'))).toEqual([]);
    }),
    { numRuns: 60, seed: 7 },
  );
});

test('a site is compared with a bounded number of others, however many there are and in whatever way they lie', () => {
  const widths = [170, 1, 0];
  for (const widthDeg of widths) {
    const made = Array.from({ length: 3000 }, (_, i) =>
      row({
        row: i + 2,
        site: `Site ${i}`,
        latitudeDeg: widthDeg * ((i * 0.618034) % 1) - widthDeg / 2,
        longitudeDeg: 2 * widthDeg * ((i * 0.754877) % 1) - widthDeg,
      }),
    );
    const workbook = { fileName: 'sites.csv', format: 'csv' as const, sheets: [], readNotes: [] };
    const counts = neighbouredSites(context(made, { workbook }), 1000).map(({ count }) => count);
    expect(counts).toHaveLength(3000);
    // Sixteen sites of each of nine cells; in one spot the cell of the spot alone.
    expect(Math.max(...counts), `${widthDeg}°`).toBeLessThanOrEqual(9 * 16);
    expect(Math.max(...counts), `${widthDeg}°`).toBeGreaterThanOrEqual(14);
  }
});
