import type { EstimateMethodId } from '@siltlight/common/wire/estimates';

/** Names of the methods as people say them, what each does in a few words, and what it is good for. */
export const methodPhrases: Record<EstimateMethodId, { name: string; does: string; suits: string }> = {
  'thin-layer-daily': {
    name: 'Thin layer, daily form',
    does: 'integrated over the sun’s path of each month with the orbit of the slice',
    suits: 'Has latitude, season and orbit in it. The first choice by region.',
  },
  'thin-layer': {
    name: 'Thin layer, half-day form',
    does: 'with one half for daylight and a mean upscatter',
    suits: 'A global-mean formula: by region it hides sun angle and season.',
  },
  'simple-albedo': {
    name: 'Simple albedo change',
    does: 'dust as a change of planetary albedo under the mean sun',
    suits: 'For a first look and for teaching.',
  },
  efficiency: {
    name: 'Efficiency times optical depth',
    does: 'with shortwave and longwave efficiencies as given',
    suits: 'When an efficiency measured for such air and ground is at hand.',
  },
};

export const methodName = (id: EstimateMethodId) => methodPhrases[id].name;
