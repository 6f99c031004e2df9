import fc from 'fast-check';
import { expect, test } from 'vitest';
import { regionalScaling } from './regional-scaling';
import type { SiteFlux } from './site-ratio';

let made = 0;
function site(
  latitudeDeg: number,
  longitudeDeg: number,
  sliceFlux: number | null,
  referenceFlux: number | null,
): SiteFlux {
  const key = `site ${++made}`;
  const error = (flux: number | null) => (flux === null ? null : 0.2 * flux);
  return {
    key,
    site: key,
    latitudeDeg,
    longitudeDeg,
    sliceFluxGM2Yr: sliceFlux,
    sliceSigmaGM2Yr: error(sliceFlux),
    referenceFluxGM2Yr: referenceFlux,
    referenceSigmaGM2Yr: error(referenceFlux),
  };
}

// East Antarctica (EAN), East Asia (EAS), Equatorial Pacific (EPO), all invented
const sites = [
  site(-75.1, 123.3, 0.01, 0.0004),
  site(36, 108, 300, 100),
  site(35, 107, 280, 70),
  site(36, 109, 420, 105),
  site(0, -140, 0.5, 0.2),
  site(1, -135, 0.6, 0.25),
];
const region = (result: ReturnType<typeof regionalScaling>, code: string) =>
  result.regions.find((r) => r.code === code)!;

test('three sites speak for their region alone, one or two are drawn to the global mean, none takes it', () => {
  const result = regionalScaling(sites);
  const asia = region(result, 'EAS');
  const ice = region(result, 'EAN');
  const sahara = region(result, 'SAH');
  expect([asia.status, ice.status, sahara.status]).toEqual(['sites', 'shrunk', 'global']);
  expect([asia.hatched, ice.hatched, sahara.hatched]).toEqual([false, true, true]);
  expect(asia.ratio).toBeGreaterThan(3);
  expect(asia.ratio).toBeLessThan(4);
  expect(ice.ratio).toBeLessThan(25);
  expect(ice.ratio).toBeGreaterThan(result.global.ratio);
  expect(sahara.ratio).toBe(result.global.ratio);
  expect(sahara.lnRatioSe).toBeGreaterThan(asia.lnRatioSe);
});

test('a site without a flux in one window is listed with its reason and moves nothing', () => {
  const lone = [...sites, site(75.1, -42.3, 0.05, null), site(75.2, -42.3, null, 0.01)];
  const result = regionalScaling(lone);
  expect(result.unused.map((s) => s.reason)).toEqual(['no-reference-flux', 'no-slice-flux']);
  expect(region(result, 'GIC').status).toBe('global');
  expect(result.global).toEqual(regionalScaling(sites).global);
  expect(result.cautions.map((c) => c.code)).toContain('sites-not-used');
});

test('the shares of error come together to the whole error', () => {
  const result = regionalScaling(sites);
  for (const r of [...result.regions, result.global]) {
    expect(Math.hypot(r.ownSe, r.sharedLoad * result.sharedSe)).toBeCloseTo(r.lnRatioSe, 10);
    expect(r.low).toBeLessThan(r.ratio);
    expect(r.high).toBeGreaterThan(r.ratio);
  }
});

test('one factor on all fluxes changes nothing, doubling the slice doubles every ratio, order does not matter', () => {
  const positive = fc.double({ min: 0.1, max: 20, noNaN: true });
  const made = fc.array(
    fc.record({
      lat: fc.double({ min: -80, max: 80, noNaN: true }),
      lon: fc.double({ min: -179, max: 179, noNaN: true }),
      slice: positive,
      reference: positive,
    }),
    { minLength: 1, maxLength: 12 },
  );
  fc.assert(
    fc.property(made, positive, (rows, factor) => {
      const given = rows.map((r) => site(r.lat, r.lon, r.slice, r.reference));
      const scaled = (slice: number, reference: number) =>
        regionalScaling(
          given.map((s) => ({
            ...s,
            sliceFluxGM2Yr: slice * s.sliceFluxGM2Yr!,
            sliceSigmaGM2Yr: slice * s.sliceSigmaGM2Yr!,
            referenceFluxGM2Yr: reference * s.referenceFluxGM2Yr!,
            referenceSigmaGM2Yr: reference * s.referenceSigmaGM2Yr!,
          })),
        );
      const base = regionalScaling(given);
      const close = (other: ReturnType<typeof regionalScaling>, times: number) =>
        other.regions.forEach((r, i) => expect(r.ratio / base.regions[i]!.ratio / times).toBeCloseTo(1, 8));
      close(scaled(factor, factor), 1);
      close(scaled(2, 1), 2);
      expect(regionalScaling([...given].reverse())).toEqual(base);
    }),
    { numRuns: 50 },
  );
});

test('a ratio outside 0.1 to 50 is cautioned by the name of its site', () => {
  const odd = site(45, 10, 800, 10);
  const result = regionalScaling([...sites, odd]);
  expect(result.cautions.find((c) => c.code === 'ratio-outside-usual')!.message).toContain(odd.site);
});

test('with fewer than three sites the spread between sites is assumed and said so', () => {
  const result = regionalScaling([sites[0]!]);
  expect(result.diagnostics.tauSquared).toBeCloseTo(Math.LN2 ** 2, 12);
  expect(result.cautions.map((c) => c.code)).toContain('few-sites-overall');
});

test('no usable site, a zero flux and a repeated site are refused', () => {
  expect(() => regionalScaling([site(0, 0, 1, null)])).toThrow(/none with a flux in both windows/);
  expect(() => regionalScaling([site(0, 0, 0, 1)])).toThrow(/sliceFluxGM2Yr is 0/);
  expect(() => regionalScaling([sites[0]!, sites[0]!])).toThrow(/each site once/);
});
