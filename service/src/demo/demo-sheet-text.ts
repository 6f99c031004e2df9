import { csvTable } from '../http/csv';
import type { DemoSheet, DemoSite } from './demo-sites';

const AGES_KA = [0.6, 1.5, 2.4, 3.3, 6.1, 8.9, 12.2, 14.8, 16.9, 19.4, 20.3, 21.2, 22.1, 24.6, 28.3, 33.1];

/** A spreadsheet as a contributor would send it: a heading row, a units row, one row a sample. The same text every time. */
export function demoSheetText(sheet: DemoSheet): string {
  const rows = sheet.sites.flatMap((site, index) => siteRows(sheet, site, index + 1));
  return csvTable([
    [
      'Site',
      'Latitude',
      'Longitude',
      'Age',
      'Age error',
      'Dust flux',
      'Flux error (1 sigma)',
      'Size cut-off',
    ],
    ['', 'degrees N', 'degrees E', 'ka BP', 'ka', sheet.fluxUnit, sheet.fluxUnit, ''],
    ...rows,
  ]);
}

function siteRows(sheet: DemoSheet, site: DemoSite, seed: number) {
  const draw = uniformDraws(seed * 7919);
  return AGES_KA.map((age) => {
    const flux = site.recentFlux * site.glacialRatio ** dustiness(age) * Math.exp(0.16 * (draw() - 0.5));
    return [
      site.site,
      site.latitudeDeg,
      site.longitudeDeg,
      age,
      round(0.05 + 0.015 * age, 2),
      round(flux * sheet.unitsPerCanonical, 4),
      round(flux * sheet.unitsPerCanonical * (0.06 + 0.06 * draw()), 3),
      'bulk',
    ];
  });
}

/** 0 in the reference window, 1 at the glacial maximum, falling off to both sides. */
function dustiness(ageKa: number): number {
  if (ageKa <= 4) return 0;
  if (ageKa < 19) return ((ageKa - 4) / 15) ** 2;
  return ageKa <= 23 ? 1 : Math.max(0.55, 1 - 0.05 * (ageKa - 23));
}

const round = (value: number, figures: number): number => Number(value.toPrecision(figures));

/** Park–Miller sequence: enough for invented scatter, and the same on every machine. */
function uniformDraws(seed: number): () => number {
  let state = seed % 2147483647;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}
