import type { TruthOfFile } from '../score-file';

export const fileSets: { name: string; files: () => AsyncGenerator<{ name: string; file: string; truth: TruthOfFile }> }[] = [];
