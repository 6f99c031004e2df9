import {
  commentXml,
  head,
  main,
  noise,
  oleWithStreams,
  tableXml,
  workbookMembers,
  workbookOf,
  zipOf,
} from './upload-reader-files';

const png = Buffer.concat([Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'), noise(200)]);
const entityXml =
  `${head}<!DOCTYPE w [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;&a;&a;&a;&a;">]>` +
  `<worksheet xmlns="${main}"><sheetData><row r="1"><c r="A1" t="inlineStr"><is><t>&b;</t></is></c></row></sheetData></worksheet>`;

function withSheet(content: Buffer | string, statedBytes?: number): Buffer {
  const members = workbookMembers({ sheet: tableXml });
  return zipOf(members.map((m) => (m.name.endsWith('sheet1.xml') ? { ...m, content, statedBytes } : m)));
}

/** An OpenDocument sheet of one row, of which row and cell say how often they are repeated. */
function repeatedOds(rows: number, columns: number): Buffer {
  const cell = `<table:table-cell office:value-type="float" office:value="1" table:number-columns-repeated="${columns}"><text:p>1</text:p></table:table-cell>`;
  const row = `<table:table-row table:number-rows-repeated="${rows}">${cell}</table:table-row>`;
  return zipOf([
    { name: 'mimetype', content: 'application/vnd.oasis.opendocument.spreadsheet' },
    { name: 'META-INF/manifest.xml', content: `${head}<manifest/>` },
    {
      name: 'content.xml',
      content: `${head}<office:document-content><office:body><office:spreadsheet><table:table table:name="S">${row}</table:table></office:spreadsheet></office:body></office:document-content>`,
    },
  ]);
}

export interface HostileFile {
  fileName: string;
  make: () => Buffer;
  /** the refusal it must meet */
  code: string;
  status: number;
}

/** Files that must be refused, each by its own check. */
export const hostileFiles: HostileFile[] = [
  {
    fileName: 'repeated-columns.ods',
    make: () => repeatedOds(1, 999_999_999),
    code: 'too-many-cells',
    status: 422,
  },
  {
    fileName: 'repeated-rows.ods',
    make: () => repeatedOds(1_048_576, 20),
    code: 'too-many-cells',
    status: 422,
  },
  { fileName: 'nothing.csv', make: () => Buffer.alloc(0), code: 'empty-file', status: 422 },
  { fileName: 'fluxes.docx', make: () => Buffer.from('site,flux'), code: 'not-a-spreadsheet', status: 415 },
  { fileName: 'noise.xlsx', make: () => noise(9000), code: 'not-a-spreadsheet', status: 415 },
  { fileName: 'noise.csv', make: () => noise(9000, 7), code: 'not-a-spreadsheet', status: 415 },
  { fileName: 'image.xlsx', make: () => png, code: 'not-a-spreadsheet', status: 415 },
  { fileName: 'image.csv', make: () => png, code: 'not-a-spreadsheet', status: 415 },
  {
    fileName: 'report.xls',
    make: () => Buffer.from('%PDF-1.7\n%âãÏÓ\n'),
    code: 'not-a-spreadsheet',
    status: 415,
  },
  {
    fileName: 'program.txt',
    make: () => Buffer.concat([Buffer.from('MZ'), Buffer.alloc(300), noise(300)]),
    code: 'not-a-spreadsheet',
    status: 415,
  },
  {
    fileName: 'page.csv',
    make: () => Buffer.from('<!DOCTYPE html><html><table></table></html>'),
    code: 'not-a-spreadsheet',
    status: 415,
  },
  {
    fileName: 'text.xlsx',
    make: () => Buffer.from('site,flux\nDome C,0.4\n'),
    code: 'extension-mismatch',
    status: 415,
  },
  {
    fileName: 'text.xls',
    make: () => Buffer.from('site\tflux\nDome C\t0.4\n'),
    code: 'extension-mismatch',
    status: 415,
  },
  {
    fileName: 'packed.xls',
    make: () => workbookOf({ sheet: tableXml }),
    code: 'extension-mismatch',
    status: 415,
  },
  {
    fileName: 'packed.csv',
    make: () => workbookOf({ sheet: tableXml }),
    code: 'extension-mismatch',
    status: 415,
  },
  {
    fileName: 'excel.ods',
    make: () => workbookOf({ sheet: tableXml }),
    code: 'extension-mismatch',
    status: 415,
  },
  { fileName: 'old.xlsx', make: () => oleWithStreams(['Workbook']), code: 'extension-mismatch', status: 415 },
  {
    fileName: 'letter.xls',
    make: () => oleWithStreams(['WordDocument']),
    code: 'not-a-spreadsheet',
    status: 415,
  },
  {
    fileName: 'archive.xlsx',
    make: () => zipOf([{ name: 'readme.xml', content: '<a/>' }]),
    code: 'not-a-spreadsheet',
    status: 415,
  },
  {
    fileName: 'secret.xlsx',
    make: () => oleWithStreams(['EncryptionInfo', 'EncryptedPackage']),
    code: 'encrypted-workbook',
    status: 422,
  },
  {
    fileName: 'secret-member.xlsx',
    make: () => zipOf(workbookMembers({ sheet: tableXml }).map((m) => ({ ...m, encrypted: true }))),
    code: 'encrypted-workbook',
    status: 422,
  },
  {
    fileName: 'secret.ods',
    make: () =>
      zipOf([
        { name: 'mimetype', content: 'application/vnd.oasis.opendocument.spreadsheet' },
        {
          name: 'META-INF/manifest.xml',
          content: `${head}<manifest:manifest><manifest:file-entry><manifest:encryption-data/></manifest:file-entry></manifest:manifest>`,
        },
        { name: 'content.xml', content: noise(500).toString('base64') },
      ]),
    code: 'encrypted-workbook',
    status: 422,
  },
  {
    fileName: 'blanks.xlsx',
    make: () => withSheet(Buffer.alloc(220 * 1024 * 1024, 0x20)),
    code: 'zip-bomb',
    status: 422,
  },
  {
    fileName: 'ratio.xlsx',
    make: () => withSheet(Buffer.alloc(40 * 1024 * 1024, 0x20)),
    code: 'zip-bomb',
    status: 422,
  },
  {
    fileName: 'picture-bomb.xlsx',
    make: () =>
      workbookOf({
        sheet: tableXml,
        more: [{ name: 'xl/media/a.png', content: Buffer.alloc(40 * 1024 * 1024) }],
      }),
    code: 'zip-bomb',
    status: 422,
  },
  {
    fileName: 'size-lie.xlsx',
    make: () => withSheet(`${head}<worksheet xmlns="${main}">${tableXml}</worksheet>`, 10),
    code: 'zip-bomb',
    status: 422,
  },
  {
    fileName: 'many-parts.xlsx',
    make: () =>
      workbookOf({
        sheet: tableXml,
        more: Array.from({ length: 1000 }, (_, i) => ({ name: `xl/p${i}.xml`, content: '<a/>' })),
      }),
    code: 'too-many-members',
    status: 422,
  },
  { fileName: 'entities.xlsx', make: () => withSheet(entityXml), code: 'xml-entity', status: 422 },
  {
    fileName: 'outside.xlsx',
    make: () =>
      withSheet(
        `${head}<!doctype w SYSTEM "file:///etc/hostname"><worksheet xmlns="${main}">${tableXml}</worksheet>`,
      ),
    code: 'xml-entity',
    status: 422,
  },
  {
    fileName: 'wide-xml.xlsx',
    make: () => withSheet(Buffer.from(entityXml, 'utf16le')),
    code: 'damaged-file',
    status: 422,
  },
  {
    fileName: 'truncated.xlsx',
    make: () => workbookOf({ sheet: tableXml }).subarray(0, 900),
    code: 'damaged-file',
    status: 422,
  },
  {
    fileName: 'cut-sheet.xlsx',
    make: () => withSheet(`${head}<worksheet xmlns="${main}">${tableXml.slice(0, -40)}`),
    code: 'damaged-file',
    status: 422,
  },
  { fileName: 'truncated.xls', make: () => oleWithStreams(['Workbook']), code: 'damaged-file', status: 422 },
  { fileName: 'empty.xlsx', make: () => zipOf([]), code: 'not-a-spreadsheet', status: 415 },
  {
    fileName: 'twice.xlsx',
    make: () => workbookOf({ sheet: tableXml, more: [{ name: 'xl/workbook.xml', content: '<workbook/>' }] }),
    code: 'damaged-file',
    status: 422,
  },
  {
    fileName: 'far-row.xlsx',
    make: () =>
      workbookOf({ sheet: '<sheetData><row r="1048576"><c r="A1048576"><v>1</v></c></row></sheetData>' }),
    code: 'too-many-rows',
    status: 422,
  },
  {
    fileName: 'far-cell.xlsx',
    make: () =>
      workbookOf({ sheet: '<sheetData><row r="1048576"><c r="XFD1048576"><v>1</v></c></row></sheetData>' }),
    code: 'too-many-columns',
    status: 422,
  },
  {
    fileName: 'long-cell.xlsx',
    make: () =>
      workbookOf({
        sheet: `<sheetData><row r="1"><c r="A1" t="inlineStr"><is><t>${'ab'.repeat(16_384)}</t></is></c></row></sheetData>`,
      }),
    code: 'cell-too-long',
    status: 422,
  },
  {
    fileName: 'wide.csv',
    make: () => Buffer.from(`${'1,'.repeat(512)}1\n`),
    code: 'too-many-columns',
    status: 422,
  },
  {
    fileName: 'long-cell.csv',
    make: () => Buffer.from(`a,b\n${'x'.repeat(32_768)},1\n`),
    code: 'cell-too-long',
    status: 422,
  },
  {
    fileName: 'zeros.csv',
    make: () => Buffer.concat([Buffer.from('a,b\n1,2\n'.repeat(10_000)), Buffer.alloc(10)]),
    code: 'damaged-file',
    status: 422,
  },
];

/** Files that are strange but hold an honest table of two rows: each must give exactly that table. */
export const strangeFiles: { fileName: string; make: () => Buffer }[] = [
  {
    fileName: 'false-extent.xlsx',
    make: () => workbookOf({ sheet: `<dimension ref="A1:XFD1048576"/>${tableXml}` }),
  },
  {
    fileName: 'merge-all.xlsx',
    make: () =>
      workbookOf({ sheet: `${tableXml}<mergeCells count="1"><mergeCell ref="A1:XFD1048576"/></mergeCells>` }),
  },
  {
    fileName: 'proto-comment.xlsx',
    make: () => workbookOf({ sheet: tableXml, comments: commentXml('__proto__') }),
  },
  {
    fileName: 'climbing-path.xlsx',
    make: () => workbookOf({ sheet: tableXml, more: [{ name: '../../outside.xml', content: '<a/>' }] }),
  },
  {
    fileName: 'ods-manifest.xlsx',
    make: () => workbookOf({ sheet: tableXml, more: [{ name: 'META-INF/manifest.xml', content: '<a/>' }] }),
  },
];
