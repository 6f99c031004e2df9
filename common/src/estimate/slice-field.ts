import { landFraction } from '../fields/land-fraction';
import { regionWeights } from '../sphere/region-weights';
import { regularGrid } from '../sphere/regular-grid';
import type { BackdropRow } from './backdrop-tiles';
import type { EstimateInputs } from './estimate-inputs';
import { lightMoments, LIGHTS, type LightMoments } from './light-moments';
import { type MemberCoefficients, memberCoefficients } from './member-fluxes';
import { centralValues } from './member-values';
import { type PreparedEstimate, prepareEstimate } from './prepared-estimate';
import { ALBEDO_POWERS } from './region-moments';

/** Fields of a slice on the working grid; row-major from the South Pole and from 180° W. */
export interface SliceField {
  stepDeg: number;
  latitudesDeg: Float64Array;
  longitudesDeg: Float64Array;
  opticalDepthSlice: Float64Array;
  opticalDepthReference: Float64Array;
  /** slice minus reference, annual mean, all sky, by the central inputs [W m⁻²] */
  netForcingWm2: Float64Array;
}

/**
 * The central case of an estimate cell by cell, for maps and grid files. Its area mean is the global mean of
 * `runEstimate`.
 *
 * Limits: a cell's backdrop and base field are those of its band and hemisphere, land and sea by its land fraction;
 * cells cut by a region's edge mix the ratios by area.
 */
export function sliceField(inputs: EstimateInputs): SliceField {
  const prepared = prepareEstimate(inputs);
  const stepDeg = inputs.stepDeg ?? 2;
  const { rows, columns, latitudesDeg, longitudesDeg } = regularGrid(stepDeg);
  const land = landFraction(stepDeg);
  const ratio = cellRatios(prepared, stepDeg);
  const slopes = rowSlopes(prepared);
  const [opticalDepthSlice, opticalDepthReference, netForcingWm2] = [0, 1, 2].map(
    () => new Float64Array(rows * columns),
  ) as [Float64Array, Float64Array, Float64Array];
  for (let cell = 0; cell < rows * columns; cell++) {
    const row = Math.floor(cell / columns);
    const depth = inputs.field.base.opticalDepth[latitudesDeg[row]! < 0 ? 'south' : 'north'];
    const onLand = land[cell]! * depth.land;
    const atSea = (1 - land[cell]!) * depth.ocean;
    const { slice, reference } = slopes[row]!;
    opticalDepthReference[cell] = onLand + atSea;
    opticalDepthSlice[cell] = ratio[cell]! * (onLand + atSea);
    netForcingWm2[cell] =
      onLand * (ratio[cell]! * slice.land - reference.land) +
      atSea * (ratio[cell]! * slice.ocean - reference.ocean);
  }
  return { stepDeg, latitudesDeg, longitudesDeg, opticalDepthSlice, opticalDepthReference, netForcingWm2 };
}

/** Ratio of each cell: that of its regions, by area. */
function cellRatios({ ratios, geometry }: PreparedEstimate, stepDeg: number): Float64Array {
  const { cells, regions, areaFraction } = regionWeights(stepDeg);
  const { rows, columns, cellAreaFraction } = regularGrid(stepDeg);
  const mean = new Float64Array(rows * columns);
  cells.forEach((cell, i) => {
    const region = regions[i]! < 0 ? geometry.codes.length : regions[i]!;
    const share = areaFraction[i]! / cellAreaFraction[Math.floor(cell / columns)]!;
    mean[cell]! += share * Math.exp(ratios[region]!.lnRatio);
  });
  return mean;
}

/** Net effect per unit optical depth [W m⁻²] over the land and the sea of a row. */
type Slope = { land: number; ocean: number };

function rowSlopes(prepared: PreparedEstimate): { slice: Slope; reference: Slope }[] {
  const { inputs, geometry, backdrop } = prepared;
  const central = memberCoefficients(prepared, centralValues(inputs));
  const lightOf = ({ orbit, solarConstantWm2 }: EstimateInputs['slice']) =>
    annualLight(lightMoments(geometry, orbit, solarConstantWm2), geometry.rows);
  const light = { slice: lightOf(inputs.slice), reference: lightOf(inputs.reference) };
  return backdrop.map((tiles, row) => {
    const slope = (state: 'slice' | 'reference'): Slope => {
      const per = (albedo: number, cloud: number) =>
        netSlope(
          inputs,
          central,
          central[state],
          light[state].subarray(row * LIGHTS, (row + 1) * LIGHTS),
          albedo,
          cloud,
        );
      return bothSurfaces(tiles, per);
    };
    return { slice: slope('slice'), reference: slope('reference') };
  });
}

function bothSurfaces(tiles: BackdropRow, per: (albedo: number, cloud: number) => number): Slope {
  return { land: per(tiles.albedoLand, tiles.cloudLand), ocean: per(tiles.albedoOcean, tiles.cloudOcean) };
}

function netSlope(
  inputs: EstimateInputs,
  { values }: MemberCoefficients,
  coefficients: Float64Array,
  light: Float64Array,
  albedo: number,
  cloud: number,
): number {
  let shortwave = 0;
  for (let j = 0; j < LIGHTS; j++) {
    const at = j * ALBEDO_POWERS;
    shortwave +=
      light[j]! * (coefficients[at]! + albedo * (coefficients[at + 1]! + albedo * coefficients[at + 2]!));
  }
  const allSky = inputs.method === 'efficiency' && inputs.shortwaveEfficiency!.sky === 'all';
  const open = inputs.longwave?.sky === 'clear' ? 1 - inputs.longwave.highCloudFraction : 1;
  return shortwave * (allSky ? 1 : 1 - cloud) + values.longwaveEfficiencyWm2 * open;
}

function annualLight({ months }: LightMoments, rows: number): Float64Array {
  const annual = new Float64Array(rows * LIGHTS);
  for (const { byRow, shareOfYear } of months) {
    for (let i = 0; i < annual.length; i++) annual[i]! += shareOfYear * byRow[i]!;
  }
  return annual;
}
