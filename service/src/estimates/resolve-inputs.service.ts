import { Injectable } from '@nestjs/common';
import type { EstimateInputs, SliceLight } from '@siltlight/common/estimate/estimate-inputs';
import { usualParameters } from '@siltlight/common/estimate/usual-parameters';
import type { EstimateRequest, OpticalSetView } from '@siltlight/common/wire/estimates';
import { BackdropsService } from '../backdrops/backdrops.service';
import type { FieldContent } from '../fields/field-content';
import { FieldsService } from '../fields/fields.service';
import { Problem, problem } from '../http/problem';
import { OpticalSetsService } from '../optics/optical-sets.service';
import { SlicesService, type SliceVersion } from '../slices/slices.service';
import type { EstimatePins } from './estimate-content';

export interface ResolvedEstimate {
  inputs: EstimateInputs;
  pins: EstimatePins;
  title: string;
  invented: boolean;
}

/** Looks up everything that a request names; what comes out is all that the computation needs. */
@Injectable()
export class ResolveInputs {
  constructor(
    private readonly fields: FieldsService,
    private readonly sets: OpticalSetsService,
    private readonly backdrops: BackdropsService,
    private readonly slices: SlicesService,
  ) {}

  async resolve(request: EstimateRequest): Promise<ResolvedEstimate> {
    const [field, opticalSet, backdrop] = await Promise.all([
      named('fieldVersionId', request, (id) => this.fields.get(id)),
      named('opticalSetVersionId', request, (id) => this.sets.get(id)),
      named('backdropVersionId', request, (id) => this.backdrops.get(id)),
    ]);
    const { content } = field;
    const [slice, reference] = await Promise.all([
      this.slices.get(content.slice.versionId),
      this.slices.get(content.reference.versionId),
    ]);
    return {
      title: request.title ?? `${content.slice.name} against ${content.reference.name.toLowerCase()}`,
      invented: content.invented,
      pins: {
        slice: { ...pinOf(slice, content.slice.name), slug: content.slice.slug },
        reference: { ...pinOf(reference, content.reference.name), slug: content.reference.slug },
        field: pinOf(field, content.title),
        opticalSet,
        backdrop: { versionId: backdrop.versionId, checksum: backdrop.checksum, title: backdrop.title },
        datasetVersions: content.datasetVersions,
      },
      inputs: {
        slice: lightOf(slice),
        reference: lightOf(reference),
        field: fieldInputs(content),
        optics: {
          singleScatteringAlbedo: opticalSet.singleScatteringAlbedo.central,
          asymmetry: opticalSet.asymmetry.central,
          massExtinctionM2PerG: opticalSet.massExtinctionM2PerG.central,
        },
        backdrop: backdrop.bands,
        transmittance: request.transmittance,
        method: request.method,
        ...shortwaveEfficiency(request),
        longwave: request.longwave.on ? { efficiencyWm2: request.longwave.efficiencyWm2, sky: 'all' } : null,
        ensemble: {
          members: request.members,
          seed: request.seed,
          varyRatios: true,
          parameters: parametersOf(request, opticalSet),
        },
      },
    };
  }
}

type Named = 'fieldVersionId' | 'opticalSetVersionId' | 'backdropVersionId';

/** A version that a request names and that is not there, or is of another kind, is a fault of that field. */
async function named<Found>(
  field: Named,
  request: EstimateRequest,
  get: (versionId: string) => Promise<Found>,
): Promise<Found> {
  const value = request[field];
  try {
    return await get(value);
  } catch (error) {
    if (!(error instanceof Problem) || error.getStatus() >= 500) throw error;
    const message = error.extras.detail ?? error.title;
    throw problem(422, 'version-unusable', `${field} cannot be used`, message, [
      { pointer: `/${field}`, field, value, message },
    ]);
  }
}

const pinOf = ({ id, checksum }: { id: string; checksum: string }, title: string) => ({
  versionId: id,
  checksum,
  title,
});

const lightOf = ({ content }: SliceVersion): SliceLight => ({
  name: content.name,
  orbit: content.orbit,
  solarConstantWm2: content.solarConstantWm2,
});

function fieldInputs(content: FieldContent): EstimateInputs['field'] {
  return {
    base: content.baseField,
    regions: content.regions.map(({ code, lnRatio, sharedLoad, ownSe, siteCount, status, hatched }) => ({
      code,
      lnRatio,
      sharedLoad,
      ownSe,
      siteCount,
      status,
      hatched,
    })),
    global: {
      lnRatio: content.global.lnRatio,
      sharedLoad: 1,
      ownSe: Math.sqrt(content.diagnostics.tauSquared),
    },
    sharedSe: content.sharedSe,
  };
}

function shortwaveEfficiency({
  method,
  shortwaveEfficiencyWm2,
}: EstimateRequest): Pick<EstimateInputs, 'shortwaveEfficiency'> {
  if (method !== 'efficiency') return {};
  if (shortwaveEfficiencyWm2 !== undefined)
    return { shortwaveEfficiency: { efficiencyWm2: shortwaveEfficiencyWm2, sky: 'all' } };
  const message = 'The method "efficiency" needs a shortwave efficiency in W m⁻² per unit optical depth.';
  throw problem(422, 'missing', 'The shortwave efficiency is missing', message, [
    {
      pointer: '/shortwaveEfficiencyWm2',
      field: 'shortwaveEfficiencyWm2',
      unit: 'W m⁻² per unit optical depth',
      allowed: [-150, 150],
      message,
    },
  ]);
}

function parametersOf(
  request: EstimateRequest,
  { singleScatteringAlbedo, asymmetry, source }: OpticalSetView,
) {
  return usualParameters({
    optics: { singleScatteringAlbedo, asymmetry, source },
    transmittance: request.transmittance,
    method: request.method,
    ...(request.shortwaveEfficiencyWm2 === undefined
      ? {}
      : { shortwaveEfficiencyWm2: request.shortwaveEfficiencyWm2 }),
    longwaveEfficiencyWm2: request.longwave.on ? request.longwave.efficiencyWm2 : null,
  });
}
