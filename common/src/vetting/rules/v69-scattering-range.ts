import { limitsOf } from '../limits';
import { numberOf, placeOf, refusedHit, textOf } from '../place';
import type { Rule } from '../rule';
import { shown } from '../wording';

const LIMITS = { albedoMin: 0.1, dustAlbedoMin: 0.7, albedoMax: 1, asymmetryMin: 0, asymmetryMax: 0.95 };

/** Single-scattering albedo of 0.1 to 1, of dust from 0.7 on; asymmetry parameter of 0 to 0.95. */
export const scatteringRange: Rule = {
  id: 'V69',
  slug: 'scattering-range',
  title: 'Single-scattering albedo or asymmetry impossible',
  severity: 'error',
  stage: 'file',
  needs: ['singleScatteringAlbedo', 'asymmetry'],
  source: 'physical bounds; lower bound for dust: common practice, no source',
  why: 'An albedo above 1 makes light, one below 0.7 is no dust, and a negative asymmetry throws most light back.',
  limits: LIMITS,
  kinds: ['point-optical-depth', 'optical-set'],

  *check(context) {
    const limits = limitsOf(context, 'V69', LIMITS);
    for (const row of context.rows) {
      const isDust = /dust|staub|poussi|polvo|mineral/i.test(textOf(row, 'aerosolSpecies') ?? '');
      for (const [field, title, min, max] of [
        [
          'singleScatteringAlbedo',
          'single-scattering albedo',
          isDust ? limits.dustAlbedoMin : limits.albedoMin,
          limits.albedoMax,
        ],
        ['asymmetry', 'asymmetry parameter', limits.asymmetryMin, limits.asymmetryMax],
      ] as const) {
        const refused = refusedHit(context, row, field, title);
        if (refused) yield refused;
        const value = numberOf(row, field);
        if (value === null || (value >= min && value <= max)) continue;
        yield {
          ...placeOf(context, row, field),
          message: `The ${title} is ${shown(value)}; it must lie within ${min} to ${max}${isDust && field === 'singleScatteringAlbedo' ? ' for dust' : ''}.`,
          remedy: 'Type the right value over it, or leave the row out with a reason.',
          remedyKind: 'mend',
        };
      }
    }
  },
};
