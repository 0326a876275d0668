/** Named maxima, used by form, API and column alike. */
export const limits = {
  nameCharacters: 120,
  emailCharacters: 254,
  passwordMinimumCharacters: 12,
  passwordMaximumCharacters: 128,
  noteCharacters: 4000,
  reasonCharacters: 2000,
  letterTextCharacters: 8000,
  addressCharacters: 400,
  projectNumberCharacters: 40,
  mixDesignationCharacters: 60,
  searchCharacters: 80,
  workbookBytes: 25 * 1024 * 1024,
  documentBytes: 15 * 1024 * 1024,
  changesAtOnce: 500,
  pageRows: 100,
} as const;
