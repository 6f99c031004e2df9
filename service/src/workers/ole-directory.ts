const END_OF_CHAIN = 0xfffffffa;
const TABLES_IN_HEADER = 109;

/**
 * Names of the streams in an OLE compound file, read from its directory sectors alone.
 * Layout after [MS-CFB]: header, sector allocation table, 128-byte directory entries with UTF-16 names.
 * Broken chains end the list; they never throw or loop.
 */
export function oleStreamNames(file: Buffer): string[] {
  if (file.length < 512) return [];
  const sectorBytes = 1 << file.readUInt16LE(0x1e);
  if (sectorBytes !== 512 && sectorBytes !== 4096) return [];
  const names: string[] = [];
  const tables = tableSectors(file, sectorBytes);
  for (const sector of chain(file, tables, file.readUInt32LE(0x30), sectorBytes)) {
    const start = (sector + 1) * sectorBytes;
    for (let entry = start; entry + 128 <= Math.min(start + sectorBytes, file.length); entry += 128) {
      const nameBytes = file.readUInt16LE(entry + 64);
      if (nameBytes > 2 && nameBytes <= 64)
        names.push(file.toString('utf16le', entry, entry + nameBytes - 2));
    }
  }
  return names;
}

function* chain(file: Buffer, tables: number[], first: number, sectorBytes: number): Iterable<number> {
  const seen = new Set<number>();
  const perTable = sectorBytes / 4;
  let sector = first;
  while (sector < END_OF_CHAIN && !seen.has(sector)) {
    seen.add(sector);
    yield sector;
    const table = tables[Math.floor(sector / perTable)];
    sector =
      table === undefined ? END_OF_CHAIN : wordAt(file, (table + 1) * sectorBytes + (sector % perTable) * 4);
  }
}

/** Where the allocation table lies: 109 sectors named in the header, the rest in a list of their own. */
function tableSectors(file: Buffer, sectorBytes: number): number[] {
  const tables: number[] = [];
  for (let i = 0; i < TABLES_IN_HEADER; i += 1) tables.push(file.readUInt32LE(0x4c + i * 4));
  const perList = sectorBytes / 4 - 1;
  const seen = new Set<number>();
  let sector = file.readUInt32LE(0x44);
  while (sector < END_OF_CHAIN && !seen.has(sector) && (sector + 1) * sectorBytes < file.length) {
    seen.add(sector);
    const start = (sector + 1) * sectorBytes;
    for (let i = 0; i < perList; i += 1) tables.push(wordAt(file, start + i * 4));
    sector = wordAt(file, start + perList * 4);
  }
  return tables;
}

const wordAt = (file: Buffer, at: number): number =>
  at + 4 <= file.length ? file.readUInt32LE(at) : END_OF_CHAIN;
