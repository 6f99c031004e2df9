import { expect } from 'vitest';
import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { neighbours } from './v58-neighbours';

const loess = { metadata: { ...answers, archive: 'loess' as const } };
const site = (name: string, longitudeDeg: number, fluxGM2Yr: number) => ({
  site: name,
  latitudeDeg: 48,
  longitudeDeg,
  fluxGM2Yr,
});
const ring = [site('A', 16, 200), site('B', 17, 260), site('C', 18, 180), site('D', 19, 310)];

examplesOf(neighbours, {
  quiet: {
    'five sites agree within a factor of two': context(rows(...ring, site('E', 17.5, 400)), loess),
    'an odd site has too few neighbours': context(rows(...ring.slice(0, 2), site('E', 17.5, 9000)), loess),
    'a steward widened the limit for loess': context(rows(...ring, site('E', 17.5, 9000)), {
      ...loess,
      limits: { V58: { byArchive: { loess: { robustSigmas: 20 } } } },
    }),
    'an odd site is far away': context(rows(...ring, site('E', 100, 9000)), loess),
  },
  fires: {
    'a site has forty times what is around it': {
      context: context(rows(...ring, site('E', 17.5, 9000)), loess),
      first: { severity: 'warning', row: 6, field: 'fluxGM2Yr', remedyKind: 'waive' },
    },
    'the sites around it are in Holdings': {
      context: context(rows(site('E', 17.5, 9000)), {
        ...loess,
        heldSites: ring.map((one) => ({
          ...one,
          datasetTitle: 'Held',
          archive: 'Löss',
          medianFluxGM2Yr: one.fluxGM2Yr,
        })),
      }),
      first: { row: 2, message: expect.stringContaining('4 sites') },
    },
    'the sites lie on both sides of the date line': {
      context: context(
        rows(
          site('A', 179, 200),
          site('B', -179, 260),
          site('C', 180, 180),
          site('D', -178, 310),
          site('E', 178, 9),
        ),
        loess,
      ),
      first: { row: 6 },
    },
  },
});
