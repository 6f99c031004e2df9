import { Column, DataType } from 'sequelize-typescript';
import { JsonColumn, Row, StoredIn } from '../../database/row';

/** Where the values of a sample stand in the file, by field. */
export type SampleCells = Record<string, { cell: string | null; raw: string; rule: string }>;

@StoredIn('samples')
export class SampleRow extends Row {
  @Column(DataType.TEXT)
  declare versionId: string;

  /** order of the file: sheet by sheet, row by row */
  @Column(DataType.INTEGER)
  declare position: number;

  @Column(DataType.TEXT)
  declare site: string;

  @Column(DataType.DOUBLE)
  declare latitudeDeg: number;

  @Column(DataType.DOUBLE)
  declare longitudeDeg: number;

  @Column(DataType.TEXT)
  declare regionCode: string | null;

  @Column(DataType.TEXT)
  declare quantity: string;

  @Column(DataType.DOUBLE)
  declare ageKaBp: number;

  @Column(DataType.DOUBLE)
  declare ageYoungKaBp: number | null;

  @Column(DataType.DOUBLE)
  declare ageOldKaBp: number | null;

  @Column(DataType.DOUBLE)
  declare ageSigmaKa: number | null;

  @Column(DataType.DOUBLE)
  declare depthM: number | null;

  @Column({ type: DataType.DOUBLE, field: 'flux_g_m2_yr' })
  declare fluxGM2Yr: number;

  @Column({ type: DataType.DOUBLE, field: 'flux_sigma_g_m2_yr' })
  declare fluxSigmaGM2Yr: number | null;

  @Column(DataType.TEXT)
  declare sizeCutoff: string | null;

  @Column(DataType.TEXT)
  declare sheet: string;

  @Column(DataType.INTEGER)
  declare row: number;

  @JsonColumn
  declare cells: SampleCells;
}
