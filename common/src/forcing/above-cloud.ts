import { readNumber } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';
import { INPUTS } from './inputs';
import { layerForcing } from './layer-forcing';
import type { LayerSolver } from './layer-scheme';
import type { SunAngles } from './sun-angles';

/** Off unless both are given. */
export interface AboveCloudInput {
  /** albedo of the cloud tops, taken as Lambertian */
  cloudAlbedo?: number;
  /** share of the optical depth that lies above the cloud */
  fractionAboveCloud?: number;
}

export const ABOVE_CLOUD_FIELDS = ['cloudAlbedo', 'fractionAboveCloud'] as const;

/** The layer as the cloudy part of the sky sees it. */
interface CloudyColumn {
  opticalDepth: number;
  singleScatteringAlbedo: number;
  cloudFraction: number;
}

/**
 * Shortwave effect in the cloudy part of the sky, before the air above is counted [W m⁻²]: the part of the layer that
 * lies above the cloud, over ground as bright as the cloud; what lies below or within counts as nothing. Absorbing dust
 * above bright cloud warms. 0, as the classical assumption has it, where the option is off.
 *
 * @throws DomainError where one of the two inputs is given without the other
 *
 * Limits: cloud tops reflect alike in all directions; no light between broken clouds.
 */
export function aboveCloudForcing(
  input: AboveCloudInput,
  column: CloudyColumn,
  sun: SunAngles,
  solve: LayerSolver,
): { shortwaveWm2: number; cautions: Caution[] } {
  if (ABOVE_CLOUD_FIELDS.every((field) => input[field] === undefined))
    return { shortwaveWm2: 0, cautions: [] };
  const cloudAlbedo = readNumber(input, INPUTS.cloudAlbedo);
  const depth = readNumber(input, INPUTS.fractionAboveCloud) * column.opticalDepth;
  if (depth === 0) return { shortwaveWm2: 0, cautions: [] };
  const overCloud = layerForcing(sun, solve(depth, column.singleScatteringAlbedo), cloudAlbedo);
  return { shortwaveWm2: column.cloudFraction * overCloud, cautions: [ABOVE_CLOUD] };
}

const ABOVE_CLOUD: Caution = {
  code: 'layer-above-cloud',
  message:
    'The result counts the part of the layer above cloud, over a cloud of one brightness: it is no longer that of the clear sky alone.',
};
