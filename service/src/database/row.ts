import { randomBytes } from 'node:crypto';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** Time-ordered identifier (UUID version 7): new rows append to the primary key's index. */
export function newId(): string {
  const bytes = randomBytes(16);
  bytes.writeUIntBE(Date.now(), 0, 6);
  bytes[6] = (bytes[6]! & 0x0f) | 0x70;
  bytes[8] = (bytes[8]! & 0x3f) | 0x80;
  const hex = bytes.toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}

/** UTC, fixed width: such texts sort in the order of time, which Sequelize's own dates do not. */
export function nowIso(): string {
  return new Date().toISOString();
}

/** Names the table; columns are the property names in snake_case; the migration alone makes the table. */
export function StoredIn(tableName: string): ClassDecorator {
  return Table({ tableName, underscored: true, timestamps: false }) as ClassDecorator;
}

export abstract class Row extends Model {
  @PrimaryKey
  @Column({ type: DataType.TEXT, defaultValue: newId })
  declare id: string;

  @Column({ type: DataType.TEXT, defaultValue: nowIso })
  declare createdAt: string;
}

/** A text column that holds JSON. STRICT tables know no JSON type, so it is parsed here, at the edge. */
export function JsonColumn(target: object, property: string): void {
  const column = Column({
    type: DataType.TEXT,
    get(this: Model) {
      const text: unknown = this.getDataValue(property as never);
      return typeof text === 'string' ? (JSON.parse(text) as unknown) : text;
    },
    set(this: Model, value: unknown) {
      const stored = value === null || value === undefined ? value : JSON.stringify(value);
      this.setDataValue(property as never, stored);
    },
  }) as PropertyDecorator;
  column(target, property);
}

/** A truth value in an INTEGER column: STRICT tables know no boolean. */
export function FlagColumn(target: object, property: string): void {
  const column = Column({
    type: DataType.INTEGER,
    get(this: Model) {
      const stored: unknown = this.getDataValue(property as never);
      return stored === null || stored === undefined ? stored : stored === 1;
    },
    set(this: Model, value: unknown) {
      this.setDataValue(property as never, value ? 1 : 0);
    },
  }) as PropertyDecorator;
  column(target, property);
}
