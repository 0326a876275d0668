import type { Endpoint } from '#shared/contracts/endpoint';
import type { FileResponse, RawExchange } from './define-route';

/** JSON by the endpoint's schema, a file, or nothing. */
export function sendAnswer(
  { response }: RawExchange['http'],
  endpoint: Endpoint,
  { status, result }: { status: number; result: unknown },
): void {
  response.setHeader('Cache-Control', 'no-store');
  if (endpoint.sends) {
    sendFile(response, fileFrom(result));
    return;
  }
  if (!endpoint.response) {
    response.status(status).end();
    return;
  }
  // Parsed on the way out too: what a presenter lets slip through is an error of ours, not the client's.
  response.status(status).json(endpoint.response.parse(result));
}

function sendFile(response: RawExchange['http']['response'], file: FileResponse): void {
  const name = encodeURIComponent(file.fileName);
  const plain = file.fileName.replace(/[^\w.\- ]/g, '_');
  response.setHeader('Content-Type', file.mediaType);
  response.setHeader(
    'Content-Disposition',
    `${file.inline ? 'inline' : 'attachment'}; filename="${plain}"; filename*=UTF-8''${name}`,
  );
  // Uploaded bytes are never a page of ours, whatever they contain.
  response.setHeader('Content-Security-Policy', "default-src 'none'; sandbox");
  response.status(200).send(file.bytes);
}

function fileFrom(result: unknown): FileResponse {
  if (typeof result === 'object' && result !== null && 'bytes' in result && Buffer.isBuffer(result.bytes)) {
    return result as FileResponse;
  }
  throw new Error('A route that sends a file returned none.');
}
