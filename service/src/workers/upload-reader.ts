import { stat } from 'node:fs/promises';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import { countInWords, defaultLimits, sizeInWords, type ReadLimits } from './limits';
import type { TextChoice } from './reader-messages';
import { runReader } from './reader-process';
import { ReaderSlots } from './reader-slots';
import { checkLeadingBytes, formatOfFileName, isTextFormat } from './sniff';
import { leadingBytes } from './text-encoding';
import { UploadRefused } from './upload-refused';
import { damaged } from './zip-directory';

export interface Upload {
  path: string;
  /** the name its sender gave it: shown, and its extension read, never used as a path */
  fileName: string;
  /** how many bytes were announced, where that is known: a shorter file is a broken transfer */
  bytes?: number;
  limits?: Partial<ReadLimits>;
  /** a person's own choice of encoding and separator for a text file */
  text?: TextChoice;
  signal?: AbortSignal;
}

/** Each reader may take well over a gigabyte, so few run at once. */
const slots = new ReaderSlots(2);

/**
 * The one way in for tables: checks size, name and leading bytes here, then has the file read in a process of
 * its own. Rejects with UploadRefused when the file is at fault, with the signal's reason when called off.
 */
export async function readUpload({
  path,
  fileName,
  bytes,
  limits: lowered,
  text,
  signal,
}: Upload): Promise<RawWorkbook> {
  signal?.throwIfAborted();
  const limits = { ...defaultLimits, ...lowered };
  const format = formatOfFileName(fileName);
  await checkSize(path, fileName, bytes, isTextFormat(format) ? limits.textBytes : limits.workbookBytes);
  const container = checkLeadingBytes(await leadingBytes(path), format, fileName);
  return slots.run(() => runReader({ path, fileName, format, container, limits, text }, signal), signal);
}

async function checkSize(
  path: string,
  fileName: string,
  announced: number | undefined,
  limit: number,
): Promise<void> {
  const { size } = await stat(path);
  if (size > limit) {
    throw new UploadRefused(
      'too-large',
      `"${fileName}" has ${countInWords(size)} bytes; ${sizeInWords(limit)} are allowed. Leave out what is not needed, or send it in parts.`,
      limit,
    );
  }
  if (size === 0)
    throw new UploadRefused('empty-file', `"${fileName}" has no content. Save it again and send that copy.`);
  if (announced !== undefined && size < announced)
    throw damaged(fileName, `only ${countInWords(size)} of ${countInWords(announced)} bytes arrived`);
}
