import type { EstimateContent } from '../../estimates/estimate-content';
import type { ExportSubject } from '../export-subject';
import { REGIONAL_COLUMNS, regionalTableCsv } from './regional-table';

const interval = (value: number) => ({ value, low: value - 0.5, high: null });
const triple = (value: number) => ({
  shortwaveWm2: interval(value),
  longwaveWm2: interval(0.1),
  netWm2: interval(value + 0.1),
});

const subject = {
  content: {
    result: {
      label: { sliceName: 'Last Glacial Maximum', referenceName: '=cmd()' },
      global: {
        opticalDepthSlice: 0.05,
        opticalDepthReference: 0.02,
        forcing: triple(-1),
        directEffect: triple(-2),
      },
      regions: [
        {
          code: 'SAH',
          name: 'Sahara, "dusty"',
          areaShare: 0.017,
          siteCount: 2,
          status: 'shrunk',
          hatched: true,
          opticalDepthSlice: 1e-7,
          opticalDepthReference: 0.2,
          forcing: triple(0.1 + 0.2),
          directEffect: triple(-3),
        },
      ],
      outside: { areaShare: 1.5e-5, forcing: triple(-0.25) },
    },
  } as unknown as EstimateContent,
} as ExportSubject;

const lines = regionalTableCsv(subject).trimEnd().split('\r\n');

test('a table has a heading, the globe, the regions and what lies in none, each with every column', () => {
  expect(lines).toHaveLength(4);
  expect(lines[0]).toBe(REGIONAL_COLUMNS.map(({ name }) => name).join(','));
  for (const line of [lines[1]!, lines[3]!]) expect(line.split(',')).toHaveLength(REGIONAL_COLUMNS.length);
  expect(new Set(REGIONAL_COLUMNS.map(({ name }) => name)).size).toBe(REGIONAL_COLUMNS.length);
});

test('numbers are the shortest text that reads back to the same double, and a bound that is not known is empty', () => {
  expect(lines[2]).toContain(',1e-7,0.2,0.30000000000000004,-0.19999999999999996,,');
  expect(lines[1]).toContain(',-1,-1.5,,0.1,-0.4,,');
});

test('texts that would run as formulas are escaped, quotes are doubled, and words stand for the status', () => {
  expect(lines[1]).toMatch(/^Last Glacial Maximum,'=cmd\(\),GLOBAL,Global mean,1,,,,/);
  expect(lines[2]).toContain(',SAH,"Sahara, ""dusty""",0.017,2,shrunk,true,');
});
