import { inflateRawSync } from 'node:zlib';
import { type Entry, fromBufferPromise, type ZipFile } from 'yauzl';
import type { WorkbookLimits } from './limits';
import { refuse, refuseTooLarge } from './refusal';

const saveAgain =
  'Open it in the spreadsheet program, save it again as an Excel workbook (.xlsx) and upload that.';

/** The zip's directory, already held against the limits; parts are inflated only when asked for. */
export interface OpenZip {
  entries: Map<string, Entry>;
  /** Inflates one part and hands it on in pieces; more bytes than the directory declares are refused. */
  inflate(entry: Entry, onChunk: (chunk: Buffer) => void): Promise<void>;
  close(): void;
}

export async function openZip(bytes: Buffer, fileName: string, limits: WorkbookLimits): Promise<OpenZip> {
  const file = await openDirectory(bytes, fileName);
  if (file.entryCount > limits.zipEntries) {
    refuseTooLarge(
      `${fileName} holds ${file.entryCount} parts, more than the ${limits.zipEntries} that are read.`,
      'Remove pictures and embedded objects that the submittal does not need, and upload it again.',
    );
  }
  const entries = new Map<string, Entry>();
  let declaredBytes = 0;
  try {
    for await (const entry of file.eachEntry()) {
      entries.set(entry.fileName.replace(/^\//, ''), entry);
      declaredBytes += entry.uncompressedSize;
    }
  } catch (error) {
    refuse(`${fileName} is damaged: its list of parts cannot be read (${reasonOf(error)}).`, saveAgain);
  }
  if (declaredBytes > limits.inflatedBytes) refuseInflated(fileName, limits);
  let inflatedBytes = 0;
  return {
    entries,
    close: () => file.close(),
    async inflate(entry, onChunk) {
      if (entry.isEncrypted()) {
        refuse(
          `${fileName} is locked with a password.`,
          'Remove the password in the spreadsheet program, save it and upload it again.',
        );
      }
      const count = (chunk: Buffer) => {
        inflatedBytes += chunk.length;
        if (inflatedBytes > limits.inflatedBytes) refuseInflated(fileName, limits);
        onChunk(chunk);
      };
      try {
        if (entry.uncompressedSize <= smallPartBytes) count(await inflateSmall(file, bytes, entry));
        else await inflateLarge(file, entry, count);
      } catch (error) {
        if (error instanceof Error && error.name === 'WorkbookRefusal') throw error;
        refuse(`${fileName} is damaged in its part ${entry.fileName} (${reasonOf(error)}).`, saveAgain);
      }
    },
  };
}

/** Most parts of a workbook are small, and a stream for each costs more than inflating it. */
const smallPartBytes = 1024 * 1024;

/** At one go, but never a byte more than the directory declares: a part that lies about its size is cut there. */
async function inflateSmall(file: ZipFile, bytes: Buffer, entry: Entry): Promise<Buffer> {
  const { fileDataStart } = await file.readLocalFileHeaderPromise(entry, { minimal: true });
  const stored = bytes.subarray(fileDataStart, fileDataStart + entry.compressedSize);
  const isDeflated = entry.compressionMethod === 8;
  if (!isDeflated && entry.compressionMethod !== 0) throw new Error('a compression method that is not known');
  const inflated = isDeflated
    ? inflateRawSync(stored, { maxOutputLength: Math.max(1, entry.uncompressedSize) })
    : stored;
  if (inflated.length !== entry.uncompressedSize) {
    throw new Error(`${inflated.length} bytes where ${entry.uncompressedSize} are declared`);
  }
  return inflated;
}

async function inflateLarge(file: ZipFile, entry: Entry, onChunk: (chunk: Buffer) => void): Promise<void> {
  const stream = await file.openReadStreamPromise(entry);
  try {
    for await (const chunk of stream) onChunk(chunk as Buffer);
  } finally {
    stream.destroy();
  }
}

async function openDirectory(bytes: Buffer, fileName: string): Promise<ZipFile> {
  try {
    return await fromBufferPromise(bytes, { lazyEntries: true, validateEntrySizes: true });
  } catch (error) {
    return refuse(
      `${fileName} is damaged or was cut short: the end of the file is missing (${reasonOf(error)}).`,
      'Upload it again; if it is refused again, open it in the spreadsheet program and save it anew.',
    );
  }
}

function refuseInflated(fileName: string, limits: WorkbookLimits): never {
  const megabytes = Math.round(limits.inflatedBytes / 1024 / 1024);
  refuseTooLarge(
    `${fileName} unpacks to more than the ${megabytes} MB that are read.`,
    'Remove sheets and cells that the submittal does not need, save it and upload it again.',
  );
}

function reasonOf(error: unknown): string {
  const message = error instanceof Error ? error.message : String(error);
  return message.split('\n')[0]?.toLowerCase().slice(0, 120) ?? '';
}
