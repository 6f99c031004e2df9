import type { EstimateInputs } from '@siltlight/common/estimate/estimate-inputs';
import type { EstimateResult } from '@siltlight/common/estimate/estimate-result';
import { runEstimate } from '@siltlight/common/estimate/run-estimate';
import { DomainError, type DomainErrorDetails } from '@siltlight/common/physical/domain-error';

/** Errors lose their class on the way between processes; a refusal goes as data, so that it stays one. */
export type ComputingAnswer =
  { result: EstimateResult } | { refused: { code: string; details: DomainErrorDetails; message: string } };

function answerTo(inputs: EstimateInputs): ComputingAnswer {
  try {
    return { result: runEstimate(inputs) };
  } catch (error) {
    if (!(error instanceof DomainError)) throw error;
    const { code, field, value, unit, allowed, remedy, message } = error;
    const details = { field, value, unit, allowed, ...(remedy === undefined ? {} : { remedy }) };
    return { refused: { code, details, message } };
  }
}

/** Estimates one after the other in a process of its own, so that the server answers meanwhile; it ends with the server. */
process.on('message', (inputs: EstimateInputs) => process.send!(answerTo(inputs)));
process.on('disconnect', () => process.exit(0));
