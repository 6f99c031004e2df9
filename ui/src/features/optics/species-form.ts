import type { IndexChoice, ParticleDefinition, SpeciesMode } from '@siltlight/common/optics/species-optics';
import { USUAL_SPREAD } from '@siltlight/common/optics/species-optics';
import { COARSE_DUST } from '@siltlight/common/optics/coarse-addition';
import { NON_SPHERICITY } from '@siltlight/common/optics/non-sphericity';
import { MIXING_RULES, type MixingRule } from '@siltlight/common/optics/mixed-index';
import { particleDefinition } from '@siltlight/common/wire/optics';
import { readNumberText } from '../../shared/form/number-text';

/** Numbers stay as they were typed; `readSpecies` makes a definition of them. */
export type IndexForm = {
  kind: IndexChoice['kind'];
  material: string;
  real: string;
  imaginary: string;
  rule: MixingRule;
  parts: { material: string; volumeFraction: string }[];
};

export const modeNumbers = [
  'medianRadiusUm',
  'geometricStdDev',
  'numberFraction',
  'minRadiusUm',
  'maxRadiusUm',
  'densityGCm3',
] as const;
export type ModeNumber = (typeof modeNumbers)[number];
export type ModeForm = { key: number; name: string; index: IndexForm } & Record<ModeNumber, string>;

export const speciesNumbers = [
  'kappa',
  'relativeHumidity',
  'coarseFactor',
  'shapeFactor',
  'radiusFactor',
  'absorptionFactor',
] as const;
export type SpeciesNumber = (typeof speciesNumbers)[number];
export type SpeciesForm = {
  modes: ModeForm[];
  /** all modes share the index of the first */
  oneIndex: boolean;
  coarse: boolean;
  shape: boolean;
} & Record<SpeciesNumber, string>;

/** Faults by the path of their field: `modes.1.maxRadiusUm`. */
export type Faults = Readonly<Record<string, string>>;

const textOf = (value: number) => String(Number(value.toPrecision(6)));

const startingIndex: IndexForm = {
  kind: 'material',
  material: 'dust-composite',
  real: '1.53',
  imaginary: '0.002',
  rule: 'bruggeman',
  parts: [
    { material: 'quartz', volumeFraction: '0.97' },
    { material: 'hematite', volumeFraction: '0.03' },
  ],
};

export function indexFormOf(choice: IndexChoice): IndexForm {
  switch (choice.kind) {
    case 'material':
      return { ...startingIndex, kind: 'material', material: choice.material };
    case 'typed':
      return {
        ...startingIndex,
        kind: 'typed',
        real: textOf(choice.real),
        imaginary: textOf(choice.imaginary),
      };
    case 'mixture':
      return {
        ...startingIndex,
        kind: 'mixture',
        rule: choice.rule,
        parts: choice.parts.map((part) => ({ ...part, volumeFraction: textOf(part.volumeFraction) })),
      };
  }
}

function modeFormOf(mode: SpeciesMode, key: number): ModeForm {
  const numbers = Object.fromEntries(modeNumbers.map((name) => [name, textOf(mode[name])]));
  return { key, name: mode.name, index: indexFormOf(mode.index), ...(numbers as Record<ModeNumber, string>) };
}

export function formOf(definition: ParticleDefinition): SpeciesForm {
  const { modes, kappa, relativeHumidity, coarseFactor, shapeFactor, spread } = definition;
  const first = JSON.stringify(modes[0]!.index);
  return {
    modes: modes.map(modeFormOf),
    oneIndex: modes.every((mode) => JSON.stringify(mode.index) === first),
    kappa: textOf(kappa),
    relativeHumidity: textOf(relativeHumidity),
    coarse: coarseFactor !== null,
    coarseFactor: textOf(coarseFactor ?? COARSE_DUST.factor.central),
    shape: shapeFactor !== null,
    shapeFactor: textOf(shapeFactor ?? NON_SPHERICITY.factor.central),
    radiusFactor: textOf(spread.radiusFactor),
    absorptionFactor: textOf(spread.absorptionFactor),
  };
}

/** One mode of dust to begin with: transported mineral of Hess et al. (1998), as the ready-made set has it. */
export const startingDefinition: ParticleDefinition = {
  modes: [
    {
      name: 'Mode 1',
      medianRadiusUm: 0.5,
      geometricStdDev: 2.2,
      numberFraction: 1,
      minRadiusUm: 0.02,
      maxRadiusUm: 5,
      densityGCm3: 2.6,
      index: { kind: 'material', material: 'dust-composite' },
    },
  ],
  kappa: 0,
  relativeHumidity: 0,
  coarseFactor: null,
  shapeFactor: null,
  spread: USUAL_SPREAD,
};

export function withMode(form: SpeciesForm): SpeciesForm {
  const last = form.modes.at(-1)!;
  const key = Math.max(...form.modes.map((mode) => mode.key)) + 1;
  return { ...form, modes: [...form.modes, { ...last, key, name: `Mode ${key + 1}` }] };
}

/** A definition where every field can be read and lies in its range; else each fault at its field. */
export function readSpecies(form: SpeciesForm): { definition: ParticleDefinition } | { faults: Faults } {
  const faults: Record<string, string> = {};
  const read = (path: string, text: string): number => {
    const number = readNumberText(text);
    if ('value' in number) return number.value;
    faults[path] = number.fault;
    return Number.NaN;
  };
  const modes = form.modes.map((mode, at) => {
    const from = `modes.${at}`;
    const numbers = Object.fromEntries(
      modeNumbers.map((name) => [name, read(`${from}.${name}`, mode[name])]),
    );
    const indexAt = form.oneIndex ? 0 : at;
    const index = readIndex(form.modes[indexAt]!.index, `modes.${indexAt}.index`, read);
    return { name: mode.name, index, ...(numbers as Record<ModeNumber, number>) };
  });
  const definition = {
    modes: sharesOf(modes),
    kappa: read('kappa', form.kappa),
    relativeHumidity: read('relativeHumidity', form.relativeHumidity),
    coarseFactor: form.coarse ? read('coarseFactor', form.coarseFactor) : null,
    shapeFactor: form.shape ? read('shapeFactor', form.shapeFactor) : null,
    spread: {
      radiusFactor: read('spread.radiusFactor', form.radiusFactor),
      absorptionFactor: read('spread.absorptionFactor', form.absorptionFactor),
    },
  };
  for (const { path, message } of particleDefinition.safeParse(definition).error?.issues ?? []) {
    faults[path.join('.')] ??= message;
  }
  if (Object.keys(faults).length > 0) return { faults };
  return { definition };
}

type Read = (path: string, text: string) => number;

function readIndex(form: IndexForm, path: string, read: Read): IndexChoice {
  if (form.kind === 'material') return { kind: 'material', material: form.material };
  if (form.kind === 'typed') {
    const [real, imaginary] = [read(`${path}.real`, form.real), read(`${path}.imaginary`, form.imaginary)];
    return { kind: 'typed', real, imaginary };
  }
  const parts = form.parts.map(({ material, volumeFraction }, at) => ({
    material,
    volumeFraction: read(`${path}.parts.${at}.volumeFraction`, volumeFraction),
  }));
  return { kind: 'mixture', rule: form.rule, parts };
}

/** Counts of particles are as good as shares: what does not add up to 1 is divided by its sum. */
function sharesOf(modes: SpeciesMode[]): SpeciesMode[] {
  const total = modes.reduce((sum, mode) => sum + mode.numberFraction, 0);
  if (!(total > 0) || Math.abs(total - 1) < 1e-5) return modes;
  if (modes.some((mode) => mode.numberFraction < 0)) return modes;
  return modes.map((mode) => ({ ...mode, numberFraction: mode.numberFraction / total }));
}

/** The computation names `modes[1].maxRadiusUm`, the form `modes.1.maxRadiusUm`. */
export const pathOf = (field: string) => field.replace(/\[(\d+)\]/g, '.$1');

export const isMixingRule = (text: string): text is MixingRule => MIXING_RULES.some((rule) => rule === text);
