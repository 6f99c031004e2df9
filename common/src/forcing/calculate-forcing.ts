import { readChoice } from '../physical/check-fields';
import type { EfficiencyInput } from './efficiency';
import type { LayerMethodInput } from './layer-method';
import type { ForcingMethod, ForcingResult } from './method';
import { FORCING_METHODS, type ForcingMethodId } from './methods';
import type { SimpleAlbedoInput } from './simple-albedo';
import type { ThinLayerDailyInput } from './thin-layer-daily';
import type { ThinLayerInput } from './thin-layer';
import type { TwoStreamInput } from './two-stream';

export type ForcingRequest =
  | ({ method: 'slanted-layer' | 'multi-stream' } & LayerMethodInput)
  | ({ method: 'two-stream' } & TwoStreamInput)
  | ({ method: 'efficiency' } & EfficiencyInput)
  | ({ method: 'simple-albedo' } & SimpleAlbedoInput)
  | ({ method: 'thin-layer' } & ThinLayerInput)
  | ({ method: 'thin-layer-daily' } & ThinLayerDailyInput);

export interface ForcingAnswer extends ForcingResult {
  method: { name: string; source: string };
}

/**
 * Forcing by the method named. The request's other fields are that method's inputs.
 *
 * @throws DomainError for an unknown method, a missing or impossible input, or one the method does not use
 */
export function calculateForcing(request: ForcingRequest): ForcingAnswer {
  const ids = Object.keys(FORCING_METHODS) as ForcingMethodId[];
  const { method: _, ...inputs } = request;
  const method = FORCING_METHODS[readChoice(request, 'method', ids)] as ForcingMethod<object>;
  return { ...method.evaluate(inputs), method: { name: method.title, source: method.source } };
}
