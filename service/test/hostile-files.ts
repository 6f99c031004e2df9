import { crc32, deflateRawSync } from 'node:zlib';

/** A member of an archive to be made, with the lies its headers may tell. */
export interface Member {
  name: string;
  content: Buffer | string;
  /** the unpacked size the headers state */
  statedBytes?: number;
  encrypted?: boolean;
}

/** A zip archive after APPNOTE 6.3: local headers, deflated content, central directory. */
export function zipOf(members: Member[]): Buffer {
  const bodies: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const member of members) {
    const content = Buffer.from(member.content as string);
    const packed = deflateRawSync(content);
    const name = Buffer.from(member.name);
    const common = Buffer.alloc(26);
    common.writeUInt16LE(20, 0);
    common.writeUInt16LE((member.encrypted ? 1 : 0) | 0x800, 2);
    common.writeUInt16LE(8, 4);
    common.writeUInt32LE(crc32(content), 10);
    common.writeUInt32LE(packed.length, 14);
    common.writeUInt32LE(member.statedBytes ?? content.length, 18);
    common.writeUInt16LE(name.length, 22);
    const local = Buffer.concat([Buffer.from('504b0304', 'hex'), common, name, packed]);
    const place = Buffer.alloc(14);
    place.writeUInt32LE(offset, 10);
    directory.push(Buffer.concat([Buffer.from('504b01021400', 'hex'), common, place, name]));
    bodies.push(local);
    offset += local.length;
  }
  const listed = Buffer.concat(directory);
  const end = Buffer.alloc(22);
  end.writeUInt32LE(0x06054b50, 0);
  end.writeUInt16LE(members.length, 8);
  end.writeUInt16LE(members.length, 10);
  end.writeUInt32LE(listed.length, 12);
  end.writeUInt32LE(offset, 16);
  return Buffer.concat([...bodies, listed, end]);
}

const head = '<?xml version="1.0" encoding="UTF-8"?>';
const office = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const main = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const packageRels = 'http://schemas.openxmlformats.org/package/2006/relationships';

export interface WorkbookParts {
  /** what stands inside <worksheet> */
  sheet: string;
  comments?: string;
  styles?: string;
  workbookPr?: string;
  sheetState?: string;
  more?: Member[];
}

export const tableXml =
  '<sheetData><row r="1"><c r="A1" t="inlineStr"><is><t>site</t></is></c><c r="B1" t="inlineStr"><is><t>flux</t></is></c></row>' +
  '<row r="2"><c r="A2" t="inlineStr"><is><t>Dome C</t></is></c><c r="B2"><v>0.42</v></c></row></sheetData>';

/** The members of a small workbook with one sheet named "Fluxes". */
export function workbookMembers({
  sheet,
  comments,
  styles,
  workbookPr = '',
  sheetState = '',
  more = [],
}: WorkbookParts): Member[] {
  const types =
    `${head}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types">` +
    '<Default Extension="xml" ContentType="application/xml"/>' +
    '<Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>' +
    '<Override PartName="/xl/workbook.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.sheet.main+xml"/>' +
    '<Override PartName="/xl/worksheets/sheet1.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.worksheet+xml"/>' +
    (styles
      ? '<Override PartName="/xl/styles.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.styles+xml"/>'
      : '') +
    (comments
      ? '<Override PartName="/xl/comments1.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.comments+xml"/>'
      : '') +
    '</Types>';
  const members: Member[] = [
    { name: '[Content_Types].xml', content: types },
    {
      name: '_rels/.rels',
      content: `${head}<Relationships xmlns="${packageRels}"><Relationship Id="rId1" Type="${office}/officeDocument" Target="xl/workbook.xml"/></Relationships>`,
    },
    {
      name: 'xl/workbook.xml',
      content: `${head}<workbook xmlns="${main}" xmlns:r="${office}">${workbookPr}<sheets><sheet name="Fluxes" sheetId="1" ${sheetState} r:id="rId1"/></sheets></workbook>`,
    },
    {
      name: 'xl/_rels/workbook.xml.rels',
      content: `${head}<Relationships xmlns="${packageRels}"><Relationship Id="rId1" Type="${office}/worksheet" Target="worksheets/sheet1.xml"/></Relationships>`,
    },
    { name: 'xl/worksheets/sheet1.xml', content: `${head}<worksheet xmlns="${main}">${sheet}</worksheet>` },
  ];
  if (styles) members.push({ name: 'xl/styles.xml', content: styles });
  if (comments) {
    members.push(
      {
        name: 'xl/worksheets/_rels/sheet1.xml.rels',
        content: `${head}<Relationships xmlns="${packageRels}"><Relationship Id="rId1" Type="${office}/comments" Target="../comments1.xml"/></Relationships>`,
      },
      { name: 'xl/comments1.xml', content: comments },
    );
  }
  return [...members, ...more];
}

export const workbookOf = (parts: WorkbookParts): Buffer => zipOf(workbookMembers(parts));

/** The date format 14 (day, month, year) as cell style 1, for cells with s="1". */
export const dateStyles =
  `${head}<styleSheet xmlns="${main}"><fonts count="1"><font/></fonts><fills count="1"><fill/></fills><borders count="1"><border/></borders>` +
  '<cellStyleXfs count="1"><xf numFmtId="0"/></cellStyleXfs><cellXfs count="2"><xf numFmtId="0"/><xf numFmtId="14" applyNumberFormat="1"/></cellXfs></styleSheet>';

const commentXml = (cell: string): string =>
  `${head}<comments xmlns="${main}"><authors><author>A</author></authors><commentList><comment ref="${cell}" authorId="0"><text><t>polluted</t></text></comment></commentList></comments>`;

/** An OLE compound file with one directory sector that names its streams; nothing in them. */
export function oleWithStreams(names: string[]): Buffer {
  const file = Buffer.alloc(512 * 3);
  Buffer.from('d0cf11e0a1b11ae1', 'hex').copy(file);
  file.writeUInt16LE(3, 0x1a);
  file.writeUInt16LE(0xfffe, 0x1c);
  file.writeUInt16LE(9, 0x1e);
  file.writeUInt16LE(6, 0x20);
  file.writeUInt32LE(1, 0x2c);
  file.writeUInt32LE(1, 0x30);
  file.writeUInt32LE(4096, 0x38);
  file.writeUInt32LE(0xfffffffe, 0x3c);
  file.writeUInt32LE(0xfffffffe, 0x44);
  file.fill(0xff, 0x4c, 512);
  file.writeUInt32LE(0, 0x4c);
  file.fill(0xff, 512, 1024);
  file.writeUInt32LE(0xfffffffd, 512);
  file.writeUInt32LE(0xfffffffe, 516);
  ['Root Entry', ...names].slice(0, 4).forEach((name, index) => {
    const entry = 1024 + index * 128;
    file.write(name, entry, 'utf16le');
    file.writeUInt16LE(name.length * 2 + 2, entry + 64);
    file[entry + 66] = index === 0 ? 5 : 2;
    file.fill(0xff, entry + 68, entry + 80);
  });
  return file;
}

/** Bytes of a seeded generator (xorshift32): noise that is the same in every run. */
export function noise(count: number, seed = 42): Buffer {
  const bytes = Buffer.alloc(count);
  let state = seed;
  for (let i = 0; i < count; i += 1) {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    bytes[i] = state & 0xff;
  }
  return bytes;
}

const png = Buffer.concat([Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'), noise(200)]);
const entityXml =
  `${head}<!DOCTYPE w [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;&a;&a;&a;&a;">]>` +
  `<worksheet xmlns="${main}"><sheetData><row r="1"><c r="A1" t="inlineStr"><is><t>&b;</t></is></c></row></sheetData></worksheet>`;

function withSheet(content: Buffer | string, statedBytes?: number): Buffer {
  const members = workbookMembers({ sheet: tableXml });
  return zipOf(members.map((m) => (m.name.endsWith('sheet1.xml') ? { ...m, content, statedBytes } : m)));
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
