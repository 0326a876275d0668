/** Something given on the command line cannot be used: one clear line, place and remedy, and exit code 2. */
export class InputFault extends Error {
  constructor(detail: string, fix: string) {
    super(`${detail} ${fix}`.replace(/\s+/g, ' ').trim());
    this.name = 'InputFault';
  }
}
