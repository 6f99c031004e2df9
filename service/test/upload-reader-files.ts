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

export const head = '<?xml version="1.0" encoding="UTF-8"?>';
const office = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
export const main = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
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

export const commentXml = (cell: string): string =>
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
