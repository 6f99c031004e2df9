export type RefusalCode =
  | 'too-large'
  | 'empty-file'
  | 'not-a-spreadsheet'
  | 'extension-mismatch'
  | 'encrypted-workbook'
  | 'zip-bomb'
  | 'too-many-members'
  | 'xml-entity'
  | 'damaged-file'
  | 'too-many-cells'
  | 'too-many-rows'
  | 'too-many-columns'
  | 'cell-too-long'
  | 'took-too-long'
  | 'too-much-memory';

interface Answer {
  status: 413 | 415 | 422;
  title: string;
}

const answers: Record<RefusalCode, Answer> = {
  'too-large': { status: 413, title: 'The file is too large' },
  'empty-file': { status: 422, title: 'The file is empty' },
  'not-a-spreadsheet': { status: 415, title: 'The file is not a spreadsheet' },
  'extension-mismatch': { status: 415, title: 'The content does not fit the file name' },
  'encrypted-workbook': { status: 422, title: 'The workbook is protected by a password' },
  'zip-bomb': { status: 422, title: 'The workbook unpacks to too much' },
  'too-many-members': { status: 422, title: 'The workbook holds too many parts' },
  'xml-entity': { status: 422, title: 'The workbook declares XML entities' },
  'damaged-file': { status: 422, title: 'The file is damaged' },
  'too-many-cells': { status: 422, title: 'The file holds too many cells' },
  'too-many-rows': { status: 422, title: 'The file holds too many rows' },
  'too-many-columns': { status: 422, title: 'The file holds too many columns' },
  'cell-too-long': { status: 422, title: 'A cell holds too much text' },
  'took-too-long': { status: 422, title: 'Reading the file took too long' },
  'too-much-memory': { status: 422, title: 'Reading the file took too much memory' },
};

/** Why an upload was not read: what was found, what is allowed, and what to do about it. */
export class UploadRefused extends Error {
  readonly status: 413 | 415 | 422;
  readonly title: string;

  constructor(
    readonly code: RefusalCode,
    /** what, where, and the remedy */
    readonly detail: string,
    /** the limit that was passed, where one was */
    readonly limit?: number,
  ) {
    super(detail);
    this.status = answers[code].status;
    this.title = answers[code].title;
  }

  /** A getter, because assigning a name fails where prototypes are frozen. */
  override get name(): string {
    return 'UploadRefused';
  }
}

export const isRefusalCode = (code: string): code is RefusalCode => Object.hasOwn(answers, code);
