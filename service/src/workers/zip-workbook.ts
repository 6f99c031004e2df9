import type { UploadFormat } from '@siltlight/common/sheet/grid';
import { countInWords, type ReadLimits } from './limits';
import { UploadRefused } from './upload-refused';
import { damaged, encrypted, type ZipMembers } from './zip-directory';

const LESS_THAN = 0x3c;
const GREATER_THAN = 0x3e;
const CELL = Buffer.from('<c');

/** Every look at the unpacked parts that comes before the spreadsheet parser sees them. */
export function checkWorkbookParts(
  members: ZipMembers,
  format: UploadFormat,
  fileName: string,
  limits: ReadLimits,
): void {
  for (const [name, content] of members) {
    if (isXml(name)) refuseDeclarations(name, content, fileName);
  }
  if (/encryption-data/i.test(members.get('META-INF/manifest.xml')?.toString('latin1') ?? ''))
    throw encrypted(fileName);
  const found = formatOfParts(members);
  if (!found) {
    throw new UploadRefused(
      'not-a-spreadsheet',
      `"${fileName}" is a packed document without a workbook in it. Save the table as .xlsx, .ods or .csv and send that.`,
    );
  }
  if (found !== (format === 'xlsm' ? 'xlsx' : format)) {
    throw new UploadRefused(
      'extension-mismatch',
      `"${fileName}" holds an .${found} workbook. Name it .${found} and send it again.`,
    );
  }
  const content = members.get('content.xml');
  if (found === 'ods' && content && repeatedCells(content) > limits.workbookCells)
    throw tooManyCells(fileName, limits.workbookCells);
  refuseCutOrOvergrownSheets(members, fileName, limits);
}

/** Parts the parser may see: for Excel formats none that would make it take the file for another kind. */
export function partsFor(members: ZipMembers, format: UploadFormat): ZipMembers {
  const foreign =
    format === 'ods'
      ? /^(objectdata\.xml|Index\/)/
      : /^(META-INF\/|objectdata\.xml|Index\/|xl\/externalLinks\/)/;
  return new Map([...members].filter(([name]) => !foreign.test(name)));
}

function formatOfParts(members: ZipMembers): 'xlsx' | 'xlsb' | 'ods' | null {
  const types = members.get('[Content_Types].xml')?.toString('latin1');
  if (types !== undefined) {
    if (/(spreadsheetml\.(sheet|template)|sheet\.macroEnabled|template\.macroEnabled)\.main\+xml/.test(types))
      return 'xlsx';
    // The binary type may also stand as the default of .bin parts in a workbook of the other kind.
    if (/sheet\.binary\.macroEnabled\.main/.test(types)) return 'xlsb';
    return null;
  }
  const mediaType =
    members.get('mimetype')?.toString('latin1') ?? members.get('META-INF/manifest.xml')?.toString('latin1');
  return members.has('content.xml') && mediaType?.includes('opendocument.spreadsheet') ? 'ods' : null;
}

const isXml = (name: string): boolean => /\.(xml|rels)$/i.test(name) || name === 'mimetype';

/** No spreadsheet program writes a document type or an entity; both exist here only to do harm. */
function refuseDeclarations(name: string, content: Buffer, fileName: string): void {
  if (content.subarray(0, 4).includes(0)) throw damaged(fileName, `"${name}" is not written in UTF-8`);
  for (let at = content.indexOf('<!'); at >= 0; at = content.indexOf('<!', at + 2)) {
    const word = content.toString('latin1', at + 2, at + 9).toUpperCase();
    if (word !== 'DOCTYPE' && !word.startsWith('ENTITY')) continue;
    throw new UploadRefused(
      'xml-entity',
      `"${fileName}" declares a document type or an entity in "${name}". Save it anew in a spreadsheet program and send that copy.`,
    );
  }
}

function refuseCutOrOvergrownSheets(members: ZipMembers, fileName: string, limits: ReadLimits): void {
  let cells = 0;
  for (const [name, content] of members) {
    if (!isXml(name) || !/<([\w-]+:)?worksheet[\s>]/.test(content.toString('latin1', 0, 2048))) continue;
    if (
      !/<(\/([\w-]+:)?worksheet\s*|([\w-]+:)?worksheet[^>]*\/)>\s*$/.test(
        content.toString('latin1', content.length - 4096),
      )
    ) {
      throw damaged(fileName, `"${name}" ends in the middle`);
    }
    cells += filledCells(content);
    if (cells > limits.workbookCells) throw tooManyCells(fileName, limits.workbookCells);
  }
}

/** Cell elements with something inside, counted without a parser. */
function filledCells(xml: Buffer): number {
  let cells = 0;
  for (let at = xml.indexOf(CELL); at >= 0; at = xml.indexOf(CELL, at + 2)) {
    const next = xml[at + 2]!;
    if (next !== 0x20 && next !== GREATER_THAN && next !== 0x0a && next !== 0x0d && next !== 0x09) continue;
    const end = xml.indexOf(GREATER_THAN, at);
    if (end > 0 && xml[end - 1] !== 0x2f && xml[end + 1] === LESS_THAN) cells += 1;
  }
  return cells;
}

/** Filled cells of an OpenDocument sheet with their repetitions: a few bytes may stand for a billion cells. */
function repeatedCells(xml: Buffer): number {
  let cells = 0;
  let rowTimes = 1;
  for (const [, tag, attributes] of xml
    .toString('latin1')
    .matchAll(/<(?:[\w-]+:)?table-(row|cell)\b([^>]*)>/g)) {
    if (tag === 'row') rowTimes = timesOf(attributes!, 'rows');
    else if (!attributes!.endsWith('/') || attributes!.includes('value'))
      cells += rowTimes * timesOf(attributes!, 'columns');
  }
  return cells;
}

const timesOf = (attributes: string, what: 'rows' | 'columns'): number =>
  Number(new RegExp(`number-${what}-repeated=["'](\\d+)["']`).exec(attributes)?.[1] ?? 1);

export const tooManyCells = (fileName: string, limit: number): UploadRefused =>
  new UploadRefused(
    'too-many-cells',
    `"${fileName}" holds more than ${countInWords(limit)} filled cells. Leave out what is not needed, or send it in parts.`,
    limit,
  );
