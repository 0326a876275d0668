import type { Readable } from 'node:stream';
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
      const stream = await openPart(file, entry, fileName);
      try {
        for await (const chunk of stream) {
          inflatedBytes += (chunk as Buffer).length;
          if (inflatedBytes > limits.inflatedBytes) refuseInflated(fileName, limits);
          onChunk(chunk as Buffer);
        }
      } catch (error) {
        stream.destroy();
        if (error instanceof Error && error.name === 'WorkbookRefusal') throw error;
        refuse(`${fileName} is damaged in its part ${entry.fileName} (${reasonOf(error)}).`, saveAgain);
      }
    },
  };
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

async function openPart(file: ZipFile, entry: Entry, fileName: string): Promise<Readable> {
  try {
    return await file.openReadStreamPromise(entry);
  } catch (error) {
    return refuse(`${fileName} is damaged in its part ${entry.fileName} (${reasonOf(error)}).`, saveAgain);
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
