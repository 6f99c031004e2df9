import { readChoice, readNumber, refuseUnused } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';
import type { RefractiveIndex } from './mie';
import {
  MAX_COMPONENTS,
  mixedIndex,
  MIXING_RULES,
  type MixingRule,
  type MixtureComponent,
} from './mixed-index';
import { readIndex, readList } from './read-index';

export interface MixedIndexRequest {
  rule: MixingRule;
  /** the first is the host; volume fractions add up to 1 */
  components: { volumeFraction: number; refractiveIndex: RefractiveIndex }[];
}

export interface MixedIndexAnswer {
  refractiveIndex: RefractiveIndex;
  cautions: Caution[];
  method: { name: string; source: string };
}

const METHODS: Record<MixingRule, { name: string; source: string }> = {
  'volume-average': { name: 'Volume mean of the refractive index', source: 'common practice, no source' },
  'maxwell-garnett': {
    name: 'Maxwell Garnett, inclusions in the first component',
    source: 'Maxwell Garnett (1904), Phil. Trans. R. Soc. A 203, 385–420 (from memory)',
  },
  bruggeman: {
    name: 'Bruggeman effective medium',
    source: 'Bruggeman (1935), Ann. Phys. 416, 636–664 (from memory)',
  },
};

/** Index of an internal mixture. @throws DomainError naming field, value and range */
export function calculateMixedIndex(request: MixedIndexRequest): MixedIndexAnswer {
  refuseUnused(request, ['rule', 'components']);
  const rule = readChoice(request, 'rule', MIXING_RULES);
  const components = readList(request, 'components', MAX_COMPONENTS).map((entry, i): MixtureComponent => {
    const prefix = `components[${i}].`;
    refuseUnused(entry, ['volumeFraction', 'refractiveIndex'], prefix);
    return {
      volumeFraction: readNumber(entry, { field: 'volumeFraction', unit: '', min: 0, max: 1 }, prefix),
      refractiveIndex: readIndex(entry, prefix),
    };
  });
  return {
    refractiveIndex: mixedIndex(rule, components),
    cautions: cautionsOf(rule, components),
    method: METHODS[rule],
  };
}

function cautionsOf(rule: MixingRule, components: MixtureComponent[]): Caution[] {
  const cautions: Caution[] = [];
  const parts = components.filter((component) => component.volumeFraction > 0);
  const absorptions = parts.map((component) => component.refractiveIndex.imaginary);
  if (rule === 'volume-average' && Math.max(...absorptions) > 10 * Math.max(1e-4, Math.min(...absorptions))) {
    cautions.push({
      code: 'absorption-overstated',
      message:
        'With a trace of an absorber the volume mean of the index gives about 1.4 to 1.7 times the absorption of Maxwell Garnett.',
    });
  }
  const inclusions = components.slice(1).reduce((sum, component) => sum + component.volumeFraction, 0);
  if (rule === 'maxwell-garnett' && inclusions > 0.5) {
    cautions.push({
      code: 'host-in-the-minority',
      message:
        'Maxwell Garnett is made for few inclusions in a host; here they take more than half the volume.',
    });
  }
  return cautions;
}
