/// <reference types="node" />
import { readFileSync } from 'node:fs';
import { inflateSync } from 'node:zlib';

/** Code points that a WOFF file draws, read from its character map (formats 4 and 12 of the OpenType cmap table). */
export function glyphsOf(path: string): Set<number> {
  const cmap = tableOf(readFileSync(path), 'cmap');
  const points = new Set<number>();
  for (let at = 0; at < cmap.readUInt16BE(2); at += 1) {
    readSubtable(cmap, cmap.readUInt32BE(4 + at * 8 + 4), points);
  }
  return points;
}

function tableOf(file: Buffer, tag: string): Buffer {
  for (let at = 0; at < file.readUInt16BE(12); at += 1) {
    const entry = 44 + at * 20;
    if (file.toString('latin1', entry, entry + 4) !== tag) continue;
    const offset = file.readUInt32BE(entry + 4);
    const packed = file.readUInt32BE(entry + 8);
    const bytes = file.subarray(offset, offset + packed);
    return packed < file.readUInt32BE(entry + 12) ? inflateSync(bytes) : bytes;
  }
  throw new Error(`The font has no ${tag} table.`);
}

function readSubtable(cmap: Buffer, start: number, points: Set<number>): void {
  const format = cmap.readUInt16BE(start);
  if (format === 4) readSegments(cmap, start, points);
  if (format === 12) readGroups(cmap, start, points);
}

function readSegments(cmap: Buffer, start: number, points: Set<number>): void {
  const doubled = cmap.readUInt16BE(start + 6);
  for (let at = 0; at < doubled; at += 2) {
    const last = cmap.readUInt16BE(start + 14 + at);
    const first = cmap.readUInt16BE(start + 16 + doubled + at);
    const delta = cmap.readUInt16BE(start + 16 + 2 * doubled + at);
    const rangeAt = start + 16 + 3 * doubled + at;
    const range = cmap.readUInt16BE(rangeAt);
    for (let point = first; point <= last && point !== 0xffff; point += 1) {
      const glyph = range === 0 ? point + delta : cmap.readUInt16BE(rangeAt + range + 2 * (point - first));
      if ((glyph & 0xffff) !== 0) points.add(point);
    }
  }
}

function readGroups(cmap: Buffer, start: number, points: Set<number>): void {
  for (let at = 0; at < cmap.readUInt32BE(start + 12); at += 1) {
    const group = start + 16 + at * 12;
    for (let point = cmap.readUInt32BE(group); point <= cmap.readUInt32BE(group + 4); point += 1)
      points.add(point);
  }
}
