import type { RawCell, UploadFormat } from '@siltlight/common/sheet/grid';
import type { ReadLimits } from './limits';
import type { Container } from './sniff';
import type { RefusalCode } from './upload-refused';

/** What the reading process is told: one file, never more. */
export interface ReadRequest {
  path: string;
  fileName: string;
  format: UploadFormat;
  container: Container;
  limits: ReadLimits;
  /** a person's own choice for a text file, in place of what would be decided */
  text?: TextChoice;
}

export const wallSecondsOf = ({ container, limits }: ReadRequest): number =>
  container === 'text' ? limits.textWallSeconds : limits.wallSeconds;

export interface TextChoice {
  encoding?: TextEncoding;
  /** one character, or one of the two blank-separated layouts */
  delimiter?: string;
}

export type TextEncoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252';

export const cellKinds: readonly RawCell['kind'][] = ['text', 'number', 'date', 'boolean', 'error'];

/** A cell on its way: nothing, a text, or [index into cellKinds, text, number, formula]. */
export type WireCell = null | string | [kind: number, text: string, number?: number | null, formula?: string];

export interface WireSheet {
  name: string;
  hidden?: boolean;
  merged?: string[];
  comments?: { cell: string; text: string }[];
}

export interface ReadNote {
  code: string;
  message: string;
}

export type ReaderMessage =
  | { type: 'sheet'; sheet: WireSheet }
  | { type: 'rows'; first: number; rows: WireCell[][] }
  /** the sheets so far were read the wrong way and come again */
  | { type: 'discard' }
  | { type: 'done'; notes: ReadNote[]; encoding?: string; delimiter?: string }
  | { type: 'refused'; code: RefusalCode; detail: string; limit?: number };

/** Hands a message to the parent and resolves when it is on its way, so that no queue builds up. */
export type Post = (message: ReaderMessage) => Promise<void>;

/** Cells in one message: small enough that taking one in does not hold up the server. */
export const cellsPerMessage = 4000;
