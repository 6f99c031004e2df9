import type { VettingContext } from './context';

/** The field of one standard error that belongs to the value of the dataset kind. */
export const sigmaField = (context: VettingContext): 'fluxSigmaGM2Yr' | 'aodSigma' =>
  context.kind === 'point-optical-depth' ? 'aodSigma' : 'fluxSigmaGM2Yr';
