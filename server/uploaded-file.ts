export interface UploadedFile {
  field: string;
  fileName: string;
  /** As the client says; what it is, is told by its content. */
  mediaType: string;
  bytes: Buffer;
}
