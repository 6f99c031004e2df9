import type { EstimateInputs } from '@siltlight/common/estimate/estimate-inputs';
import type { EstimateRequest, EstimateResult } from '@siltlight/common/wire/estimates';

export const ESTIMATE = 'estimate';

export interface Pin {
  versionId: string;
  checksum: string;
  title: string;
}

/** What a run rests on, by version and checksum. */
export interface EstimatePins {
  slice: Pin & { slug: string };
  reference: Pin & { slug: string };
  field: Pin;
  opticalSet: Pin;
  backdrop: Pin;
  datasetVersions: { versionId: string; checksum: string }[];
}

/** Content of an estimate: what is hashed. The same pins, inputs and code give the same bytes. */
export interface EstimateContent {
  title: string;
  invented: boolean;
  codeVersion: string;
  request: EstimateRequest;
  pins: EstimatePins;
  inputs: EstimateInputs;
  result: EstimateResult;
}
