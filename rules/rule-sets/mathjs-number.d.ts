export {};

/** The factory of the parser alone: the package exports it without describing it. */
declare module 'mathjs/number' {
  export function createParse(parts: Record<string, unknown>): (text: string) => unknown;
}
