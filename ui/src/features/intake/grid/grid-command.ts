/** Set anew to bring a cell into view and the keyboard to it, with a text in the editor where one is proposed. */
export type GridCommand = { edit: string | null };
