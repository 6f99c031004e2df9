import { PARAMETERS } from '@siltlight/common/tables/parameters';
import type { BackdropView, OpticalSetView } from '@siltlight/common/wire/estimates';
import { estimateRequest } from '@siltlight/common/wire/estimates';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import { airSentence, groundSentence, methodSentence, opticsSentence, plainText } from './sentences';
import { faultOf, intoAddress, requestOf, setUpOf, startingSetUp, type SetUp } from './set-up';

const field = {
  title: 'LGM by regional scaling',
  sliceName: 'Last Glacial Maximum',
  referenceName: 'Pre-industrial',
  sizeCutoff: '< 20 µm',
  diagnostics: { usedSites: 14, regionsWithSites: 8 },
} as FieldDetail;
const optics = {
  title: 'Mineral dust, mean of 19 soils',
  number: 2,
  singleScatteringAlbedo: { low: 0.94, central: 0.96, high: 0.98 },
} as OpticalSetView;
const backdrop = { title: 'Zonal table', number: 3 } as BackdropView;

test('each fold is told in one sentence that names what was chosen', () => {
  expect(plainText(airSentence(field))).toBe(
    'Dust of the Last Glacial Maximum from LGM by regional scaling (regional scaling, 14 sites in 8 regions), against pre-industrial; size fraction < 20 µm.',
  );
  expect(plainText(opticsSentence(optics, startingSetUp))).toBe(
    'Optical set Mineral dust, mean of 19 soils, version 2; single-scattering albedo 0.960 (0.940 to 0.980); longwave on, +8.00 W/m² per unit optical depth.',
  );
  expect(plainText(groundSentence(backdrop, startingSetUp))).toBe(
    'Surface albedo and cloud of both slices from Zonal table, version 3; transmittance of the air above the dust 0.76.',
  );
  expect(plainText(methodSentence(startingSetUp))).toMatch(
    /^Thin layer, daily form, .*; 1024 members, seed 20417\.$/,
  );
});

test('a fold without a choice says what to pick, and longwave off is said', () => {
  expect(plainText(airSentence(undefined))).toMatch(/^Pick the field/);
  expect(plainText(opticsSentence(optics, { ...startingSetUp, longwave: false }))).toMatch(/longwave off\.$/);
});

test('a method that does not use the transmittance says so', () => {
  expect(plainText(groundSentence(backdrop, { ...startingSetUp, method: 'efficiency' }))).toMatch(
    /does not use the transmittance/,
  );
});

test('a set-up comes back from its address as it was, and the start leaves the address empty', () => {
  const setUp: SetUp = {
    ...startingSetUp,
    field: 'f1',
    method: 'efficiency',
    longwave: false,
    shortwaveEfficiency: -33,
    transmittance: 0.7,
    title: 'Sensitivity, first',
  };
  expect(setUpOf(intoAddress(new URLSearchParams(), setUp))).toEqual(setUp);
  expect(intoAddress(new URLSearchParams('region=SAH'), startingSetUp).toString()).toBe('region=SAH');
});

test('numbers in the address that lie outside their range fall back to the start', () => {
  const setUp = setUpOf(new URLSearchParams('transmittance=7&members=10&seed=abc&method=none'));
  expect(setUp).toEqual(startingSetUp);
});

test('a complete set-up is a valid request, an incomplete one is none', () => {
  const complete: SetUp = { ...startingSetUp, field: 'f', optics: 'o', backdrop: 'b' };
  expect(estimateRequest.safeParse(requestOf(complete)).success).toBe(true);
  expect(estimateRequest.safeParse(requestOf({ ...complete, method: 'efficiency' })).success).toBe(true);
  expect(requestOf({ ...complete, optics: null })).toBeNull();
});

test('a number outside its range is refused with the range named', () => {
  expect(faultOf('transmittance', 1.2)).toBe('Enter a number from 0.3 to 1.');
  expect(faultOf('longwaveEfficiency', -30)).toBe('Enter a number from \u221220 to 60.');
  expect(faultOf('members', 100.5)).toBe('Enter a whole number.');
  expect(faultOf('seed', 0)).toBeNull();
});

test('the numbers a set-up starts with are those of the parameter list', () => {
  const central = (symbol: string, scope: string) =>
    PARAMETERS.find((row) => row.symbol === symbol && row.scope === scope)?.central;
  expect(startingSetUp.transmittance).toBe(central('T_atm', 'global'));
  expect(startingSetUp.longwaveEfficiency).toBe(central('E_LW', 'all-sky global mean'));
  expect(startingSetUp.shortwaveEfficiency).toBe(central('E_SW', 'all-sky global mean'));
});
