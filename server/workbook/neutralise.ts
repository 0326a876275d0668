/**
 * Text that a spreadsheet would take for a formula, made plain by a leading apostrophe, as spreadsheets do
 * themselves. Tabs and line ends in front would hide the sign from a naive check, so they count too.
 */
export function neutralise(text: string): string {
  return /^[\s\u00a0\ufeff]*[=+\-@|%\uff1d\uff0b\uff0d\uff20]/.test(text) && !isPlainNumber(text)
    ? `'${text}`
    : text;
}

function isPlainNumber(text: string): boolean {
  return /^[+-]?\d+(?:\.\d+)?$/.test(text);
}
