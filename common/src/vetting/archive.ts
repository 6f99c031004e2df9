/** Kinds of archive that limits, ranges and surfaces are told apart by; as the metadata form offers them. */
export type Archive = 'ice' | 'marine' | 'loess' | 'lake' | 'peat' | 'other';
