/** The package ships these types, but its "exports" hide them from the compiler. */
declare module "cephes" {
  const cephes: {
    readonly compiled: Promise<void>;
    incbet(a: number, b: number, x: number): number;
    [name: string]: unknown;
  };
  export default cephes;
}
