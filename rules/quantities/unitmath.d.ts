/** The library ships no types for this build, the only one that Node, bundlers and browsers all load as it is. */
declare module 'unitmath/dist/UnitMath.js' {
  interface Unit {
    to(target: string): Unit;
    readonly value: number;
  }
  interface UnitFactory {
    (value: number, unit: string): Unit;
    config(options: {
      definitions: {
        baseQuantities?: string[];
        units: Record<string, string | { value: string | [number, string] | number; quantity?: string }>;
      };
    }): UnitFactory;
  }
  const unit: UnitFactory;
  export default unit;
}
