import type { RatioError } from '../ensemble/ratio-draws';
import { DomainError, requireWithin } from '../physical/domain-error';
import { type BackdropRow, backdropRows } from './backdrop-tiles';
import type { EstimateInputs } from './estimate-inputs';
import { lightMoments } from './light-moments';
import { centralValues, requireParameters } from './member-values';
import { type RegionGeometry, regionGeometry } from './region-geometry';
import { type RegionMoments, regionMoments } from './region-moments';

/** An estimate with all that does not change from member to member worked out. */
export interface PreparedEstimate {
  inputs: EstimateInputs;
  geometry: RegionGeometry;
  backdrop: BackdropRow[];
  slice: RegionMoments;
  reference: RegionMoments;
  /** in the order of the geometry, "none" last */
  ratios: RatioError[];
}

/** @throws DomainError when an input is impossible or does not fit the method */
export function prepareEstimate(inputs: EstimateInputs): PreparedEstimate {
  requireFit(inputs);
  const geometry = regionGeometry(inputs.stepDeg ?? 2);
  const backdrop = backdropRows(inputs.backdrop, geometry);
  const momentsOf = ({ orbit, solarConstantWm2 }: EstimateInputs['slice']) =>
    regionMoments(
      geometry,
      backdrop,
      inputs.field.base.opticalDepth,
      lightMoments(geometry, orbit, solarConstantWm2),
    );
  return {
    inputs,
    geometry,
    backdrop,
    slice: momentsOf(inputs.slice),
    reference: momentsOf(inputs.reference),
    ratios: ratiosInOrder(inputs, geometry),
  };
}

function ratiosInOrder({ field }: EstimateInputs, geometry: RegionGeometry): RatioError[] {
  const ordered = geometry.codes.map((code) => {
    const region = field.regions.find((candidate) => candidate.code === code);
    if (!region) {
      throw new DomainError('region-missing', {
        field: 'field.regions',
        value: code,
        allowed: 'a ratio for every region',
      });
    }
    return region;
  });
  return [...ordered, field.global];
}

function requireFit(inputs: EstimateInputs): void {
  centralValues(inputs);
  requireParameters(inputs);
  requireWithin('massExtinctionM2PerG', inputs.optics.massExtinctionM2PerG, 'm² g⁻¹', 1e-4, 100);
  requireWithin('field.sharedSe', inputs.field.sharedSe, '', 0, 10);
  requireField(inputs.field);
  requireWithin('ensemble.members', inputs.ensemble.members, '', 1, 65_536);
  for (const { solarConstantWm2 } of [inputs.slice, inputs.reference]) {
    requireWithin('solarConstantWm2', solarConstantWm2, 'W m⁻²', 500, 2000);
  }
  if (inputs.method === 'efficiency' && !inputs.shortwaveEfficiency) {
    throw new DomainError('efficiency-missing', {
      field: 'shortwaveEfficiency',
      value: 'none',
      unit: 'W m⁻²',
      allowed: 'a number per unit optical depth and the sky it belongs to',
      remedy: 'Give the shortwave efficiency, or choose another method.',
    });
  }
  if (inputs.longwave?.sky === 'clear') {
    requireWithin('longwave.highCloudFraction', inputs.longwave.highCloudFraction, '', 0, 1);
  }
}

function requireField({ base, regions, global }: EstimateInputs['field']): void {
  for (const hemisphere of ['south', 'north'] as const) {
    for (const surface of ['land', 'ocean'] as const) {
      const field = `field.base.opticalDepth.${hemisphere}.${surface}`;
      requireWithin(field, base.opticalDepth[hemisphere][surface], '', 0, 5);
    }
  }
  for (const { lnRatio, sharedLoad, ownSe } of [...regions, global]) {
    requireWithin('field.lnRatio', lnRatio, '', -10, 10);
    requireWithin('field.sharedLoad', sharedLoad, '', 0, 1);
    requireWithin('field.ownSe', ownSe, '', 0, 10);
  }
}
