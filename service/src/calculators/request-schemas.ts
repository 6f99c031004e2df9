import type { ApiBodyOptions } from '@nestjs/swagger';
import { LAYER_SCHEME_IDS } from '@siltlight/common/forcing/calculate-layer';
import { FORCING_METHODS } from '@siltlight/common/forcing/methods';
import { CLOSURE_IDS } from '@siltlight/common/forcing/two-stream-closures';
import { MIXING_RULES } from '@siltlight/common/optics/mixed-index';

type SchemaObject = Exclude<Extract<ApiBodyOptions, { schema: unknown }>['schema'], { $ref: string }>;

type Properties = Record<string, SchemaObject>;

/** Units stand in the names; ranges are told by the refusal, where `common` checks them. */
const number: SchemaObject = { type: 'number' };
const numbers = (...names: string[]): Properties => Object.fromEntries(names.map((name) => [name, number]));
const choice = (...values: string[]): SchemaObject => ({ type: 'string', enum: values });
const object = (properties: Properties, required = Object.keys(properties)): SchemaObject => ({
  type: 'object',
  properties,
  required,
});

const orbit = object(numbers('eccentricity', 'obliquityDeg', 'perihelionLongitudeDeg'));
const refractiveIndex = object(numbers('real', 'imaginary'));
const list = (items: SchemaObject): SchemaObject => ({ type: 'array', items, minItems: 1 });
const gases = object(numbers('co2Ppm', 'ch4Ppb', 'n2oPpb'));
const longwave: SchemaObject = {
  description:
    'By efficiency, or as a thin grey absorbing layer. opticalDepth is that of infrared absorption.',
  oneOf: [
    object(numbers('efficiencyWm2')),
    object(
      numbers(
        'opticalDepth',
        'surfaceTemperatureK',
        'layerTemperatureK',
        'diffusivity',
        'highCloudFraction',
        'gasTransmission',
      ),
      ['opticalDepth', 'surfaceTemperatureK', 'layerTemperatureK'],
    ),
  ],
};

/** Bodies of the calculator operations, for the document; `common` reads and checks them. */
export const requestSchemas = {
  orbit: object({ ...numbers('ageKaBp'), solution: choice('berger1978') }, ['ageKaBp']),
  insolation: object(
    { orbit, ...numbers('ageKaBp', 'latitudeDeg', 'solarLongitudeDeg', 'dayOfYear', 'solarConstantWm2') },
    ['latitudeDeg'],
  ),
  forcing: object(
    {
      method: choice(...Object.keys(FORCING_METHODS)),
      ...numbers('opticalDepth', 'shortwaveEfficiencyWm2', 'longwaveEfficiencyWm2', 'highCloudFraction'),
      efficiencySky: choice('all', 'clear'),
      ...numbers(
        'insolationWm2',
        'albedoChange',
        'solarConstantWm2',
        'daylightFraction',
        'transmittance',
        'cloudFraction',
      ),
      ...numbers(
        'surfaceAlbedo',
        'singleScatteringAlbedo',
        'upscatterFraction',
        'asymmetry',
        'cosSolarZenith',
        'cloudAlbedo',
        'fractionAboveCloud',
        'latitudeDeg',
        'ageKaBp',
      ),
      ...numbers('solarLongitudeDeg'),
      closure: choice(...CLOSURE_IDS),
      orbit,
      longwave,
    },
    ['method'],
  ),
  layer: object(
    {
      ...numbers('opticalDepth', 'singleScatteringAlbedo', 'asymmetry', 'cosSolarZenith', 'surfaceAlbedo'),
      scheme: choice(...LAYER_SCHEME_IDS),
    },
    ['opticalDepth', 'singleScatteringAlbedo', 'asymmetry', 'surfaceAlbedo', 'scheme'],
  ),
  mie: object({ ...numbers('sizeParameter'), refractiveIndex }),
  'mode-optics': object({
    ...numbers('wavelengthUm'),
    modes: list(
      object(
        {
          ...numbers('medianRadiusUm', 'geometricStdDev', 'numberFraction', 'minRadiusUm', 'maxRadiusUm'),
          ...numbers('densityGCm3'),
          refractiveIndex,
        },
        ['medianRadiusUm', 'geometricStdDev', 'densityGCm3', 'refractiveIndex'],
      ),
    ),
  }),
  'mixed-index': object({
    rule: choice(...MIXING_RULES),
    components: list(object({ ...numbers('volumeFraction'), refractiveIndex })),
  }),
  upscatter: object(
    { ...numbers('asymmetry', 'cosSolarZenith'), approximation: choice('henyey-greenstein', 'linear') },
    ['asymmetry'],
  ),
  greenhouse: object({
    ...numbers('co2Ppm', 'ch4Ppb', 'n2oPpb'),
    reference: gases,
    formula: choice('myhre1998', 'etminan2016', 'meinshausen2020'),
  }),
  column: object(numbers('depositionGM2Yr', 'lifetimeDays', 'massExtinctionM2PerG')),
  'humidity-growth': object(numbers('kappa', 'relativeHumidity')),
  'region-areas': object({ regionSet: choice('ar6') }),
} satisfies Record<string, SchemaObject>;
