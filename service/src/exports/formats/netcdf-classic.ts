/**
 * Writer of the classic NetCDF format with 64-bit offsets (CDF-2), for fixed dimensions.
 * Byte-stable: the same input gives the same bytes, on any machine, at any hour.
 * Format: NetCDF Classic and 64-bit Offset File Formats, OGC 10-092r3.
 */
export type NcType = 'char' | 'int' | 'float' | 'double';
export type NcAttribute = string | { type: 'int' | 'float' | 'double'; values: readonly number[] };

export interface NcVariable {
  name: string;
  type: NcType;
  dimensions: readonly string[];
  attributes: Readonly<Record<string, NcAttribute>>;
  /** row-major; for char one string per innermost row, padded with NUL */
  data: ArrayLike<number> | readonly string[];
}

export interface NcDataset {
  dimensions: Readonly<Record<string, number>>;
  attributes: Readonly<Record<string, NcAttribute>>;
  variables: readonly NcVariable[];
}

const TYPE_CODE: Record<NcType, number> = { char: 2, int: 4, float: 5, double: 6 };
const TYPE_BYTES: Record<NcType, number> = { char: 1, int: 4, float: 4, double: 8 };
const TAG = { dimension: 10, variable: 11, attribute: 12 };

const padded = (length: number): number => (length + 3) & ~3;

/** @throws Error when a variable names an unknown dimension or its data do not fill its shape */
export function writeNetcdfClassic(dataset: NcDataset): Buffer {
  const dimensionNames = Object.keys(dataset.dimensions);
  const bodies = dataset.variables.map((variable) => encodeData(variable, dataset.dimensions));
  // The header's length does not depend on the offsets in it: write it once with zeros to learn where data begin.
  const headerLength = header(dataset, dimensionNames, bodies, []).length;
  const offsets: number[] = [];
  let offset = headerLength;
  for (const body of bodies) {
    offsets.push(offset);
    offset += body.length;
  }
  return Buffer.concat([header(dataset, dimensionNames, bodies, offsets), ...bodies]);
}

function header(dataset: NcDataset, dimensionNames: string[], bodies: Buffer[], offsets: number[]): Buffer {
  const parts: Buffer[] = [Buffer.from([0x43, 0x44, 0x46, 2]), int32(0)];
  parts.push(...listHead(TAG.dimension, dimensionNames.length));
  for (const name of dimensionNames) parts.push(text(name), int32(dataset.dimensions[name] ?? 0));
  parts.push(attributes(dataset.attributes));
  parts.push(...listHead(TAG.variable, dataset.variables.length));
  dataset.variables.forEach((variable, index) => {
    parts.push(text(variable.name), int32(variable.dimensions.length));
    for (const dimension of variable.dimensions) parts.push(int32(dimensionNames.indexOf(dimension)));
    parts.push(attributes(variable.attributes), int32(TYPE_CODE[variable.type]));
    parts.push(int32(bodies[index]?.length ?? 0), int64(offsets[index] ?? 0));
  });
  return Buffer.concat(parts);
}

function attributes(list: Readonly<Record<string, NcAttribute>>): Buffer {
  const entries = Object.entries(list);
  const parts: Buffer[] = [...listHead(TAG.attribute, entries.length)];
  for (const [name, value] of entries) {
    parts.push(text(name));
    if (typeof value === 'string') {
      const bytes = Buffer.from(value, 'utf8');
      parts.push(int32(TYPE_CODE.char), int32(bytes.length), fill(bytes));
    } else {
      parts.push(
        int32(TYPE_CODE[value.type]),
        int32(value.values.length),
        fill(numbers(value.type, value.values)),
      );
    }
  }
  return Buffer.concat(parts);
}

function encodeData(variable: NcVariable, dimensions: Readonly<Record<string, number>>): Buffer {
  const shape = variable.dimensions.map((name) => {
    const size = dimensions[name];
    if (size === undefined) throw new Error(`${variable.name} has the unknown dimension ${name}`);
    return size;
  });
  const wanted = shape.reduce((product, size) => product * size, 1);
  if (variable.type === 'char') {
    const width = shape.at(-1) ?? 1;
    const rows = variable.data as readonly string[];
    if (rows.length * width !== wanted)
      throw new Error(`${variable.name} has ${rows.length} texts for ${wanted / width}`);
    return fill(Buffer.concat(rows.map((row) => fixedWidth(row, width))));
  }
  if (variable.data.length !== wanted) {
    throw new Error(`${variable.name} has ${variable.data.length} values for a shape of ${wanted}`);
  }
  return fill(numbers(variable.type, variable.data as ArrayLike<number>));
}

function fixedWidth(row: string, width: number): Buffer {
  const bytes = Buffer.from(row, 'utf8');
  if (bytes.length > width) throw new Error(`"${row}" takes ${bytes.length} bytes, ${width} are there`);
  return Buffer.concat([bytes, Buffer.alloc(width - bytes.length)]);
}

function numbers(type: 'int' | 'float' | 'double', values: ArrayLike<number>): Buffer {
  const size = TYPE_BYTES[type];
  const bytes = Buffer.alloc(values.length * size);
  for (let i = 0; i < values.length; i++) {
    const value = values[i] ?? 0;
    if (type === 'int') bytes.writeInt32BE(value, i * size);
    else if (type === 'float') bytes.writeFloatBE(value, i * size);
    else bytes.writeDoubleBE(value, i * size);
  }
  return bytes;
}

/** An empty list is written as two zeros, not as its tag and a zero. */
const listHead = (tag: number, count: number): Buffer[] =>
  count === 0 ? [int32(0), int32(0)] : [int32(tag), int32(count)];

function fill(bytes: Buffer): Buffer {
  return bytes.length === padded(bytes.length)
    ? bytes
    : Buffer.concat([bytes, Buffer.alloc(padded(bytes.length) - bytes.length)]);
}

function text(value: string): Buffer {
  const bytes = Buffer.from(value.normalize('NFC'), 'utf8');
  return Buffer.concat([int32(bytes.length), fill(bytes)]);
}

function int32(value: number): Buffer {
  const bytes = Buffer.alloc(4);
  bytes.writeInt32BE(value);
  return bytes;
}

function int64(value: number): Buffer {
  const bytes = Buffer.alloc(8);
  bytes.writeBigInt64BE(BigInt(value));
  return bytes;
}
