import type { EstimateMethodId, EstimateRequest } from '@siltlight/common/wire/estimates';

/** What the set-up page holds; all of it stands in the address, so that a reload or a link loses nothing. */
export type SetUp = {
  field: string | null;
  optics: string | null;
  backdrop: string | null;
  method: EstimateMethodId;
  transmittance: number;
  longwave: boolean;
  longwaveEfficiency: number;
  shortwaveEfficiency: number;
  members: number;
  seed: number;
  title: string;
};

/**
 * Where a set-up starts. Transmittance 0.76: Charlson et al. (1992), from memory. Efficiencies: global all-sky means
 * of the parameter list (implied by Kok et al. 2023, from memory). Members and seed: common practice, no source.
 */
export const startingSetUp: SetUp = {
  field: null,
  optics: null,
  backdrop: null,
  method: 'thin-layer-daily',
  transmittance: 0.76,
  longwave: true,
  longwaveEfficiency: 8,
  shortwaveEfficiency: -13,
  members: 1024,
  seed: 20417,
  title: '',
};

/** Ranges of the schema `estimateRequest`, for messages before anything is sent. */
export const setUpRanges = {
  transmittance: [0.3, 1],
  longwaveEfficiency: [-20, 60],
  shortwaveEfficiency: [-150, 150],
  members: [64, 4096],
  seed: [0, 4_294_967_295],
} as const satisfies Partial<Record<keyof SetUp, readonly [number, number]>>;

export type NumberName = keyof typeof setUpRanges;

const whole: ReadonlySet<NumberName> = new Set(['members', 'seed']);

/** What is wrong with a number, with the remedy; null when nothing is. */
export function faultOf(name: NumberName, value: number): string | null {
  const [low, high] = setUpRanges[name];
  if (whole.has(name) && !Number.isInteger(value)) return 'Enter a whole number.';
  if (value < low || value > high)
    return `Enter a number from ${String(low).replace('-', '\u2212')} to ${high}.`;
  return null;
}

const methods: readonly EstimateMethodId[] = [
  'thin-layer-daily',
  'thin-layer',
  'simple-albedo',
  'efficiency',
];

function numberOf(params: URLSearchParams, name: NumberName): number {
  const text = params.get(name);
  const value = text === null || text.trim() === '' ? Number.NaN : Number(text);
  return Number.isFinite(value) && faultOf(name, value) === null ? value : startingSetUp[name];
}

export function setUpOf(params: URLSearchParams): SetUp {
  const method = methods.find((one) => one === params.get('method'));
  return {
    field: params.get('field'),
    optics: params.get('optics'),
    backdrop: params.get('backdrop'),
    method: method ?? startingSetUp.method,
    transmittance: numberOf(params, 'transmittance'),
    longwave: params.get('longwave') !== 'off',
    longwaveEfficiency: numberOf(params, 'longwaveEfficiency'),
    shortwaveEfficiency: numberOf(params, 'shortwaveEfficiency'),
    members: numberOf(params, 'members'),
    seed: numberOf(params, 'seed'),
    title: params.get('title') ?? '',
  };
}

/** Writes a set-up into the address; what equals the start is left out, so that addresses stay short. */
export function intoAddress(before: URLSearchParams, setUp: SetUp): URLSearchParams {
  const next = new URLSearchParams(before);
  for (const name of Object.keys(startingSetUp) as (keyof SetUp)[]) {
    const value = setUp[name];
    if (value === null || value === startingSetUp[name]) next.delete(name);
    else next.set(name, name === 'longwave' ? 'off' : String(value));
  }
  return next;
}

/** The request of a complete set-up; null while a choice is missing. */
export function requestOf(setUp: SetUp): EstimateRequest | null {
  if (!setUp.field || !setUp.optics || !setUp.backdrop) return null;
  return {
    ...(setUp.title.trim() && { title: setUp.title.trim() }),
    fieldVersionId: setUp.field,
    opticalSetVersionId: setUp.optics,
    backdropVersionId: setUp.backdrop,
    method: setUp.method,
    transmittance: setUp.transmittance,
    longwave: { on: setUp.longwave, efficiencyWm2: setUp.longwaveEfficiency },
    ...(setUp.method === 'efficiency' && { shortwaveEfficiencyWm2: setUp.shortwaveEfficiency }),
    members: setUp.members,
    seed: setUp.seed,
  };
}
