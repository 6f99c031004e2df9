import { limitsOf } from '../limits';
import { opticalDepths } from '../optical-depth';
import { numberOf, placeOf, textOf } from '../place';
import type { Rule } from '../rule';
import { shown } from '../wording';

const LIMITS = { min: -0.5, max: 2.5, dustMax: 0.75 };

/** Ångström exponents in their usual range, and small where the depth is called dust. */
export const angstromExponent: Rule = {
  id: 'V64',
  slug: 'angstrom-exponent',
  title: 'Ångström exponent unusual',
  severity: 'warning',
  stage: 'file',
  needs: ['angstromExponent'],
  source: 'common practice, no source',
  why: 'Dust is coarse and its depth hardly changes with wavelength; a large exponent says smoke or haze.',
  limits: LIMITS,

  *check(context) {
    const { min, max, dustMax } = limitsOf(context, 'V64', LIMITS);
    for (const { row } of opticalDepths(context)) {
      const exponent = numberOf(row, 'angstromExponent');
      if (exponent === null) continue;
      const isDust = /dust|staub|poussi|polvo/i.test(textOf(row, 'aerosolSpecies') ?? '');
      const top = isDust ? dustMax : max;
      if (exponent >= min && exponent <= top) continue;
      yield {
        ...placeOf(context, row, 'angstromExponent'),
        message: `The Ångström exponent is ${shown(exponent)}; ${min} to ${top} is usual${isDust ? ' for dust' : ''}.`,
        remedy: 'Check the value and the species, or waive it with a reason.',
        remedyKind: 'waive',
      };
    }
  },
};
