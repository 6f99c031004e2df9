import { z } from 'zod';
import { isoTime, personMark } from './shared';

export const exportFormat = z.enum(['regional-table-csv', 'slice-fields-netcdf']);
export type ExportFormat = z.infer<typeof exportFormat>;

/** A published estimate, or one's own computed one (then the file says that it is not signed off). */
export const exportRequest = z.object({ estimateId: z.string().max(64), format: exportFormat }).strict();

export const exportSummary = z.object({
  id: z.string(),
  title: z.string(),
  format: exportFormat,
  state: z.enum(['queued', 'running', 'done', 'failed', 'cancelled']),
  jobId: z.string(),
  fileName: z.string().nullable(),
  bytes: z.number().int().nullable(),
  sha256: z.string().nullable(),
  estimateId: z.string(),
  estimateTitle: z.string(),
  createdBy: personMark,
  createdAt: isoTime,
});
export type ExportSummary = z.infer<typeof exportSummary>;
