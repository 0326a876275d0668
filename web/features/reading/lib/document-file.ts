/** What a document's file may be. The server looks at the content; this spares a pointless upload. */
export const documentFileTypes = ['application/pdf', 'image/png', 'image/jpeg', 'image/webp'];

export function documentFileFault(
  file: Pick<File, 'name' | 'size' | 'type'>,
  mostBytes: number,
): string | null {
  if (file.size === 0) return `${file.name} is empty. Choose the file again.`;
  if (file.size > mostBytes) {
    return `${file.name} is larger than ${Math.round(mostBytes / 1024 / 1024)} MB. Choose a smaller file.`;
  }
  if (file.type !== '' && !documentFileTypes.includes(file.type)) {
    return `${file.name} is neither a PDF nor an image. Choose a PDF, PNG, JPEG or WebP file.`;
  }
  return null;
}
