import type { UploadFormat } from '@siltlight/common/sheet/grid';
import { UploadRefused } from './upload-refused';

/** What the leading bytes say a file is. */
export type Container = 'zip' | 'ole' | 'text';

const formats: Record<string, UploadFormat> = {
  '.xlsx': 'xlsx',
  '.xlsm': 'xlsm',
  '.xlsb': 'xlsb',
  '.xls': 'xls',
  '.ods': 'ods',
  '.csv': 'csv',
  '.tsv': 'tsv',
  '.tab': 'tsv',
  '.txt': 'txt',
};

const containers: Record<UploadFormat, Container> = {
  xlsx: 'zip',
  xlsm: 'zip',
  xlsb: 'zip',
  ods: 'zip',
  xls: 'ole',
  csv: 'text',
  tsv: 'text',
  txt: 'text',
};

/** Leading bytes of what is often sent by mistake; from the formats' own specifications. */
const strangers: [name: string, hex: string][] = [
  ['a PNG image', '89504e470d0a'],
  ['a JPEG image', 'ffd8ff'],
  ['a GIF image', '47494638'],
  ['a TIFF image', '49492a00'],
  ['a TIFF image', '4d4d002a'],
  ['a PDF document', '255044462d'],
  ['a gzip archive', '1f8b08'],
  ['a 7-Zip archive', '377abcaf271c'],
  ['a RAR archive', '526172211a07'],
  ['an HDF5 or NetCDF-4 file', '894844460d0a'],
  ['a NetCDF file', '43444601'],
  ['a NetCDF file', '43444602'],
  ['a NetCDF file', '43444605'],
  ['a database file', '53514c69746520666f726d6174'],
  ['a program', '7f454c46'],
  ['a rich-text document', '7b5c727466'],
];

const list = '.xlsx, .xlsm, .xlsb, .xls, .ods, .csv, .tsv, .tab or .txt';

export function formatOfFileName(fileName: string): UploadFormat {
  const extension = /\.[^.\\/]*$/.exec(fileName)?.[0].toLowerCase() ?? '';
  const format = Object.hasOwn(formats, extension) ? formats[extension] : undefined;
  if (!format) {
    throw new UploadRefused(
      'not-a-spreadsheet',
      `"${fileName}" does not end in ${list}. Save the table as one of these and send that.`,
    );
  }
  return format;
}

export const isTextFormat = (format: UploadFormat): boolean => containers[format] === 'text';

/** 16-bit text without a mark shows as zeros at every other byte of its Latin letters and digits. */
export function utf16Pattern(bytes: Buffer): 'utf-16le' | 'utf-16be' | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  const pairs = Math.floor(bytes.length / 2);
  let evenZeros = 0;
  let oddZeros = 0;
  for (let i = 0; i < pairs * 2; i += 2) {
    if (bytes[i] === 0) evenZeros += 1;
    if (bytes[i + 1] === 0) oddZeros += 1;
  }
  if (oddZeros > pairs * 0.4 && evenZeros < pairs * 0.02) return 'utf-16le';
  if (evenZeros > pairs * 0.4 && oddZeros < pairs * 0.02) return 'utf-16be';
  return null;
}

/** Text has no zero bytes and hardly any control characters; random bytes have a tenth of them. */
function looksLikeText(bytes: Buffer): boolean {
  if (utf16Pattern(bytes)) return true;
  let controls = 0;
  for (const byte of bytes) {
    if (byte === 0) return false;
    const blank = byte === 9 || byte === 10 || byte === 12 || byte === 13 || byte === 0x1a;
    if (byte < 32 && !blank) controls += 1;
  }
  return controls <= bytes.length * 0.01;
}

function containerOf(bytes: Buffer, fileName: string): Container {
  const hex = bytes.subarray(0, 16).toString('hex');
  const stranger = strangers.find(([, start]) => hex.startsWith(start));
  if (stranger) {
    throw new UploadRefused(
      'not-a-spreadsheet',
      `"${fileName}" is ${stranger[0]}. Send the table itself, as ${list}.`,
    );
  }
  if (hex.startsWith('504b0304') || hex.startsWith('504b0506')) return 'zip';
  if (hex.startsWith('d0cf11e0a1b11ae1')) return 'ole';
  // Excel 2 to 4 wrote bare record streams: a begin-of-file record of 4 to 6 bytes.
  if (/^09(00|02|04)0[46]00/.test(hex)) return 'ole';
  if (!looksLikeText(bytes)) {
    throw new UploadRefused(
      'not-a-spreadsheet',
      `"${fileName}" holds neither a workbook nor text. Open it in the program that made it and save it as ${list}.`,
    );
  }
  if (
    /^\s*<(!doctype|html|\?xml|table|svg)/i.test(
      bytes.subarray(0, 512).toString('latin1').replaceAll('\0', ''),
    )
  ) {
    throw new UploadRefused(
      'not-a-spreadsheet',
      `"${fileName}" is a web page or XML document. Open it in a spreadsheet program and save it as ${list}.`,
    );
  }
  return 'text';
}

const advice: Record<Container, string> = {
  zip: 'it holds a packed workbook, so name it .xlsx, .xlsm, .xlsb or .ods',
  ole: 'it holds an older Excel workbook, so name it .xls',
  text: 'it holds plain text, so name it .csv, .tsv or .txt',
};

/**
 * Extension and leading bytes must agree before any parser runs. An OLE container named .xlsx may be an
 * encrypted workbook; its directory decides that later.
 */
export function checkLeadingBytes(bytes: Buffer, format: UploadFormat, fileName: string): Container {
  const found = containerOf(bytes, fileName);
  const expected = containers[format];
  if (found !== expected && !(found === 'ole' && expected === 'zip')) throw mismatch(fileName, found);
  return found;
}

export function mismatch(fileName: string, found: Container): UploadRefused {
  return new UploadRefused(
    'extension-mismatch',
    `"${fileName}" is not what its name says: ${advice[found]}, or save it again in the format of its name.`,
  );
}
