import { parentPort, workerData } from 'node:worker_threads';
import type { EstimateInputs } from '@siltlight/common/estimate/estimate-inputs';
import { runEstimate } from '@siltlight/common/estimate/run-estimate';

/** One estimate on a thread of its own, so that the server answers meanwhile. */
parentPort!.postMessage(runEstimate(workerData as EstimateInputs));
