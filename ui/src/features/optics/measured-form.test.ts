import { emptyRow, measuredFormOf, readMeasured } from './measured-form';

const row = {
  wavelengthUm: 0.55,
  massExtinctionM2PerG: { low: 0.4, central: 0.6, high: 0.8 },
  singleScatteringAlbedo: { low: 0.9, central: 0.94, high: 0.97 },
  asymmetry: { low: 0.65, central: 0.7, high: 0.75 },
};

test('measured values come out of the form as they went in', () => {
  expect(readMeasured(measuredFormOf([row]))).toEqual({ rows: [row] });
});

test('an empty row is faulty in every column, and bounds that cross are told at their middle', () => {
  const empty = readMeasured([emptyRow(0)]);
  expect('faults' in empty && Object.keys(empty.faults)).toHaveLength(10);
  const crossed = readMeasured(
    measuredFormOf([{ ...row, asymmetry: { low: 0.8, central: 0.7, high: 0.75 } }]),
  );
  expect('faults' in crossed && crossed.faults['0.asymmetry.central']).toMatch(/must rise/);
});
