/** Text of each file of common/src/tables, by its file name. */
export declare function generate(): Promise<Record<string, string>>;
