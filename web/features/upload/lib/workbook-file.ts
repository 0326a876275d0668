/** Endings that the server reads; it looks at the content too, this only spares a pointless upload. */
export const workbookEndings = ['.xlsx', '.csv', '.tsv'];

export function workbookFileFault(file: Pick<File, 'name' | 'size'>, mostBytes: number): string | null {
  const name = file.name.toLowerCase();
  if (name.endsWith('.xls')) {
    return `${file.name} is in the old .xls format. Save it as .xlsx and choose that file.`;
  }
  if (name.endsWith('.xlsm')) {
    return `${file.name} may carry macros. Save it as .xlsx, without macros, and choose that file.`;
  }
  if (!workbookEndings.some((ending) => name.endsWith(ending))) {
    return `${file.name} is not a workbook. Choose a file saved as .xlsx, .csv or .tsv.`;
  }
  if (file.size === 0) return `${file.name} is empty. Choose the file again.`;
  if (file.size > mostBytes) {
    return `${file.name} is larger than ${Math.round(mostBytes / 1024 / 1024)} MB. Take out pictures and unused sheets, then choose it again.`;
  }
  return null;
}
