const MIB = 1024 * 1024;

/** How much one upload may ask of the machine. A caller may lower any of these; each refusal names its limit. */
export interface ReadLimits {
  workbookBytes: number;
  textBytes: number;
  zipMembers: number;
  unpackedBytes: number;
  /** unpacked over packed, judged once a member has grown past `ratioFromBytes` */
  unpackRatio: number;
  ratioFromBytes: number;
  workbookRows: number;
  textRows: number;
  columns: number;
  cellCharacters: number;
  workbookCells: number;
  textCells: number;
  /** processor time of the reading process: the same on a busy machine as on an idle one */
  cpuSeconds: number;
  /** time on the clock for workbooks, for a reader that waits for ever or a machine that is overrun */
  wallSeconds: number;
  /** for text tables, which are streamed: their memory does not grow with them */
  textWallSeconds: number;
  /** resident memory of the reading process, buffers included */
  residentBytes: number;
  /** the JavaScript heap alone, which does not bound buffers */
  heapMiB: number;
}

export const defaultLimits: Readonly<ReadLimits> = {
  workbookBytes: 50 * MIB,
  textBytes: 200_000_000,
  zipMembers: 1000,
  unpackedBytes: 200 * MIB,
  unpackRatio: 200,
  ratioFromBytes: 16 * MIB,
  workbookRows: 200_000,
  textRows: 1_000_000,
  columns: 512,
  cellCharacters: 32_767,
  workbookCells: 4_000_000,
  textCells: 12_000_000,
  cpuSeconds: 25,
  wallSeconds: 60,
  textWallSeconds: 120,
  residentBytes: 1792 * MIB,
  heapMiB: 1536,
};

/** "50 MiB", or plain bytes when that is not a whole number of them. */
export function sizeInWords(bytes: number): string {
  if (bytes >= MIB) return `${Number((bytes / MIB).toFixed(1))} MiB`;
  return `${bytes.toLocaleString('en-GB')} bytes`;
}

export const countInWords = (count: number): string => count.toLocaleString('en-GB');
