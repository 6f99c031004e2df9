import { readChoice, readNumber, refuseUnused } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';
import { upscatterAt, upscatterMean } from '../optics/upscatter';
import { addingDoubling } from './adding-doubling-scheme';
import { coakleyChylek } from './coakley-chylek';
import { firstOrderBracket } from './first-order-layer';
import { INPUTS } from './inputs';
import { overSurface } from './lambertian-surface';
import { negativeReflectance } from './layer-method';
import type { LayerScheme } from './layer-scheme';
import { thinLayerForcing } from './thin-layer';
import { thinLayerCautions } from './thin-layer-cautions';
import { twoStreamScheme } from './two-stream-scheme';

export interface LayerRequest {
  opticalDepth: number;
  singleScatteringAlbedo: number;
  asymmetry: number;
  /** absent: isotropic incidence, which is also the mean over the sunlit hemisphere */
  cosSolarZenith?: number;
  surfaceAlbedo: number;
  scheme: LayerSchemeId;
}

export interface LayerAnswer {
  /** planetary albedo of layer and surface */
  reflectance: number;
  /** downward flux reaching the surface, multiple reflections included; null by thin layer */
  transmittance: number | null;
  /** in the layer; null by thin layer */
  absorptance: number | null;
  cautions: Caution[];
  method: { name: string; source: string };
}

/** Schemes that solve the layer, by the name a request uses. */
export const LAYER_SCHEMES = {
  'coakley-chylek': coakleyChylek,
  'delta-eddington': twoStreamScheme('delta-eddington'),
  'multi-stream': addingDoubling,
} as const satisfies Record<string, LayerScheme>;

export type LayerSchemeId = keyof typeof LAYER_SCHEMES | 'thin-layer';

export const LAYER_SCHEME_IDS: readonly LayerSchemeId[] = [
  ...(Object.keys(LAYER_SCHEMES) as (keyof typeof LAYER_SCHEMES)[]),
  'thin-layer',
];

const OPTICAL_DEPTH = { ...INPUTS.opticalDepth, max: 100 };

/**
 * What a layer over a Lambertian surface does with the sunlight falling on it.
 *
 * @throws DomainError naming the field at fault
 */
export function calculateLayer(request: LayerRequest): LayerAnswer {
  refuseUnused(request, [
    'opticalDepth',
    'singleScatteringAlbedo',
    'asymmetry',
    'cosSolarZenith',
    'surfaceAlbedo',
    'scheme',
  ]);
  const scheme = readChoice(request, 'scheme', LAYER_SCHEME_IDS);
  const layer: Layer = {
    opticalDepth: readNumber(request, OPTICAL_DEPTH),
    singleScatteringAlbedo: readNumber(request, INPUTS.singleScatteringAlbedo),
    asymmetry: readNumber(request, INPUTS.asymmetry),
    surfaceAlbedo: readNumber(request, INPUTS.surfaceAlbedo),
    cosSolarZenith: request.cosSolarZenith === undefined ? null : readNumber(request, INPUTS.cosSolarZenith),
  };
  return scheme === 'thin-layer' ? byThinLayer(layer) : byScheme(layer, LAYER_SCHEMES[scheme]);
}

interface Layer {
  opticalDepth: number;
  singleScatteringAlbedo: number;
  asymmetry: number;
  surfaceAlbedo: number;
  cosSolarZenith: number | null;
}

function byScheme(layer: Layer, scheme: LayerScheme): LayerAnswer {
  const { opticalDepth, singleScatteringAlbedo, asymmetry, surfaceAlbedo, cosSolarZenith } = layer;
  const suns = cosSolarZenith === null ? [] : [cosSolarZenith];
  const solved = scheme.prepare(asymmetry, Float64Array.from(suns))(opticalDepth, singleScatteringAlbedo);
  const { reflectances, transmittances, diffuse } = solved;
  const light =
    cosSolarZenith === null ? diffuse : { reflectance: reflectances[0]!, transmittance: transmittances[0]! };
  return {
    ...overSurface(light, diffuse, surfaceAlbedo),
    cautions: negativeReflectance(solved),
    method: { name: scheme.title, source: scheme.source },
  };
}

/** First order in τ: R_s + ΔA, at the sun angle or as the mean 2∫μ₀ΔA dμ₀. */
function byThinLayer(layer: Layer): LayerAnswer {
  const { opticalDepth, singleScatteringAlbedo, asymmetry, surfaceAlbedo, cosSolarZenith } = layer;
  const mean = upscatterMean(asymmetry);
  const change =
    cosSolarZenith === null
      ? -2 * thinLayerForcing(1, surfaceAlbedo, opticalDepth, singleScatteringAlbedo, mean)
      : (opticalDepth / cosSolarZenith) *
        firstOrderBracket(
          singleScatteringAlbedo,
          surfaceAlbedo,
          upscatterAt(asymmetry, cosSolarZenith),
          mean,
          cosSolarZenith,
        );
  const reflectance = surfaceAlbedo + change;
  const cautions = thinLayerCautions({ ...layer, upscatterFraction: mean });
  if (reflectance < 0 || reflectance > 1) cautions.push(impossible(reflectance));
  return {
    reflectance,
    transmittance: null,
    absorptance: null,
    cautions,
    method: {
      name: 'Thin layer',
      source: 'First order of Coakley & Chylek (1975), J. Atmos. Sci. 32, 409–418',
    },
  };
}

const impossible = (reflectance: number): Caution => ({
  code: 'reflectance-impossible',
  message: `A reflectance of ${reflectance.toPrecision(3)} does not exist: the thin layer is linear in optical depth and has left its range. Use coakley-chylek or multi-stream.`,
});
