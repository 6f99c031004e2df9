import type {
  correctionsRequest,
  decisionRequest,
  mappingSchema,
  submissionMetadata,
  SubmissionDetail,
} from '@siltlight/common/wire/submissions';
import type { AxiosRequestConfig } from 'axios';
import type { z } from 'zod';
import { api } from '../../shared/api/client';

export type Mapping = z.infer<typeof mappingSchema>;
export type Metadata = z.infer<typeof submissionMetadata>;
export type NewCorrection = z.infer<typeof correctionsRequest>['corrections'][number];
export type Decision = z.infer<typeof decisionRequest>;
export type RowPlace = { sheet: string; row: number };
export type CellPlace = { sheet: string; row: number; column: string };

/** One change of a submission: where it goes and what is sent. The revision is added when it is sent. */
export type Change = (path: string, options: AxiosRequestConfig) => Promise<SubmissionDetail>;

const post =
  (act: string, body?: unknown): Change =>
  (path, options) =>
    api.post(`${path}/${act}`, body, options);
const put =
  (act: string, body: unknown): Change =>
  (path, options) =>
    api.put(`${path}/${act}`, body, options);

export const setMapping = (mapping: Mapping) => put('mapping', mapping);
export const setMetadata = (metadata: Metadata) => put('metadata', metadata);
export const correct = (corrections: NewCorrection[]) => post('corrections', { corrections });
export const undoCorrection =
  (correctionId: string): Change =>
  (path, options) =>
    api.delete(`${path}/corrections/${correctionId}`, options);
export const leaveOut = (rows: RowPlace[], reason: string) => post('leave-out', { rows, reason });
export const takeBack = (rows: RowPlace[]) => post('take-back', { rows });
export const handIn = () => post('submit');
export const withdraw = (reason: string) => post('withdraw', { reason });
export const claim = () => post('claim');
export const release = () => post('release');
export const waive = (findingKeys: string[], reason: string) => post('waivers', { findingKeys, reason });
export const pinQuery = (place: CellPlace, text: string) => post('queries', { ...place, text });
export const reply = (queryId: string, text: string) => post(`queries/${queryId}/replies`, { text });
export const decide = (decision: Decision) => post('decision', decision);
