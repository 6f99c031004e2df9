import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { readCsv } from '../../reference/read';

interface Descriptor {
  licenses: { name: string }[];
  resources: {
    path: string;
    schema?: { fields: { name: string; type: string; unit?: string; source?: string }[] };
  }[];
}

const root = path.join(__dirname, '..', '..', 'reference');
const folders = [
  ...readdirSync(root),
  ...readdirSync(path.join(root, 'checks')).map((name) => `checks/${name}`),
].filter(
  (name) =>
    statSync(path.join(root, name)).isDirectory() &&
    readdirSync(path.join(root, name)).some((f) => f.endsWith('.csv')),
);

test.each(folders)(
  'the descriptor of reference/%s names every table, column, unit, source and licence',
  (folder) => {
    const descriptor = JSON.parse(
      readFileSync(path.join(root, folder, 'datapackage.json'), 'utf8'),
    ) as Descriptor;
    expect(descriptor.licenses.length).toBeGreaterThan(0);
    const tables = readdirSync(path.join(root, folder)).filter((name) => name.endsWith('.csv'));
    expect(descriptor.resources.map((resource) => resource.path)).toEqual(expect.arrayContaining(tables));
    for (const { path: file, schema } of descriptor.resources) {
      expect(existsSync(path.join(root, folder, file)), file).toBe(true);
      if (!schema) continue;
      const columns = Object.keys(readCsv(`${folder}/${file}`)[0]!);
      expect(
        schema.fields.map((field) => field.name),
        file,
      ).toEqual(columns);
      for (const field of schema.fields) {
        if (field.type !== 'string') expect(field.unit, `${file}: ${field.name}`).toBeTruthy();
        if (field.name !== 'source') expect(field.source, `${file}: ${field.name}`).toBeTruthy();
      }
    }
  },
);
