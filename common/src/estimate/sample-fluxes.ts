import { drawParameters } from '../ensemble/parameter-draws';
import { drawRatios } from '../ensemble/ratio-draws';
import type { FluxSamples } from './forcing-triple';
import { FLUXES, type MemberCoefficients, memberCoefficients, memberFluxesInto } from './member-fluxes';
import { centralValues, type MemberValues, requireValue } from './member-values';
import type { PreparedEstimate } from './prepared-estimate';

export interface SampledEstimate {
  /** in the order of the geometry, "none" last; a set without area (a grid that no gap touches) has none */
  regions: FluxSamples[];
  global: FluxSamples;
}

/** Fluxes of the central case and of every member, per region and for the globe (their sum, places in no region included). */
export function sampleFluxes(prepared: PreparedEstimate): SampledEstimate {
  const { geometry, ratios, inputs } = prepared;
  const central = memberCoefficients(prepared, centralValues(inputs));
  const { coefficients, memberRatios } = drawMembers(prepared);
  const members = coefficients.length;
  const global: FluxSamples = {
    central: new Float64Array(FLUXES),
    members: new Float64Array(members * FLUXES),
    areaShare: 1,
  };
  const regions = ratios.map((ratio, region) => {
    const samples: FluxSamples = {
      central: new Float64Array(FLUXES),
      members: new Float64Array(members * FLUXES),
      areaShare: geometry.regionArea[region]!,
    };
    memberFluxesInto(samples.central, 0, prepared, central, prepared, region, Math.exp(ratio.lnRatio));
    coefficients.forEach((member, m) => {
      const drawn = memberRatios[m * ratios.length + region]!;
      memberFluxesInto(samples.members, m * FLUXES, prepared, member, prepared, region, drawn);
    });
    addInto(global.central, samples.central);
    addInto(global.members, samples.members);
    return samples;
  });
  return { regions, global };
}

function addInto(sum: Float64Array, part: Float64Array): void {
  for (let i = 0; i < sum.length; i++) sum[i]! += part[i]!;
}

function drawMembers(prepared: PreparedEstimate): {
  coefficients: MemberCoefficients[];
  memberRatios: Float64Array;
} {
  const { inputs, ratios } = prepared;
  const { members, seed, parameters, varyRatios } = inputs.ensemble;
  const draws = drawParameters(
    parameters.map((parameter) => parameter.distribution),
    1, // the error of the global ratio, shared by the regions that lean on it
    members,
    seed,
  );
  const coefficients = Array.from({ length: members }, (_, m) => {
    const values: MemberValues = centralValues(inputs);
    parameters.forEach(({ name }, j) => {
      values[name] = draws.values[m * parameters.length + j]!;
      requireValue(name, values[name]);
    });
    return memberCoefficients(prepared, values);
  });
  const errors = varyRatios ? ratios : ratios.map((ratio) => ({ ...ratio, sharedLoad: 0, ownSe: 0 }));
  return { coefficients, memberRatios: drawRatios(errors, inputs.field.sharedSe, draws.uniforms, seed) };
}
