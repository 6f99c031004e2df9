const SECTOR = 512;
const FREE = 0xffffffff;
const END_OF_CHAIN = 0xfffffffe;
const FAT_SECTOR = 0xfffffffd;
const ENTRY = 128;

/**
 * What a spreadsheet program writes when a workbook gets a password: a compound file whose streams are
 * EncryptionInfo and EncryptedPackage (open specification MS-OFFCRYPTO, 2.3.4). The streams are empty here.
 */
export function encryptedWorkbook(): Buffer {
  return Buffer.concat([header(), allocation(), directory()]);
}

function header(): Buffer {
  const sector = Buffer.alloc(SECTOR);
  Buffer.from('d0cf11e0a1b11ae1', 'hex').copy(sector);
  sector.writeUInt16LE(0x3e, 24);
  sector.writeUInt16LE(3, 26); // version 3: sectors of 512 bytes
  sector.writeUInt16LE(0xfffe, 28);
  sector.writeUInt16LE(9, 30);
  sector.writeUInt16LE(6, 32);
  sector.writeUInt32LE(1, 44); // one sector of the allocation table
  sector.writeUInt32LE(1, 48); // the directory begins in sector 1
  sector.writeUInt32LE(4096, 56);
  sector.writeUInt32LE(END_OF_CHAIN, 60);
  sector.writeUInt32LE(END_OF_CHAIN, 68);
  sector.fill(0xff, 76);
  sector.writeUInt32LE(0, 76);
  return sector;
}

function allocation(): Buffer {
  const sector = Buffer.alloc(SECTOR, 0xff);
  sector.writeUInt32LE(FAT_SECTOR, 0);
  sector.writeUInt32LE(END_OF_CHAIN, 4);
  return sector;
}

function directory(): Buffer {
  const sector = Buffer.alloc(SECTOR);
  entry(sector, 0, 'Root Entry', 5, 1);
  entry(sector, 1, 'EncryptionInfo', 2, FREE, 2);
  entry(sector, 2, 'EncryptedPackage', 2, FREE);
  entry(sector, 3, '', 0, FREE);
  return sector;
}

function entry(sector: Buffer, at: number, name: string, kind: number, child: number, right = FREE): void {
  const start = at * ENTRY;
  sector.write(name, start, 'utf16le');
  sector.writeUInt16LE(name ? (name.length + 1) * 2 : 0, start + 64);
  sector.writeUInt8(kind, start + 66);
  sector.writeUInt8(1, start + 67);
  sector.writeUInt32LE(FREE, start + 68);
  sector.writeUInt32LE(right, start + 72);
  sector.writeUInt32LE(child, start + 76);
  sector.writeUInt32LE(END_OF_CHAIN, start + 116);
}
