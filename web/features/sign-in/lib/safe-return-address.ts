/** Where a sign-in goes on to: only an address of this product, never another site. */
export function safeReturnAddress(text: string | null): string | null {
  if (!text?.startsWith('/') || text.startsWith('//') || text.includes('\\')) return null;
  return text.startsWith('/sign-in') ? null : text;
}
