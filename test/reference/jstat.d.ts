/** The part of jstat that the tests use; the package brings no types. */
declare module 'jstat' {
  interface Distribution {
    cdf(x: number, ...parameters: number[]): number;
    inv(probability: number, ...parameters: number[]): number;
    variance(...parameters: number[]): number;
  }
  export const jStat: {
    readonly normal: Distribution;
    readonly uniform: Distribution;
    readonly studentt: Distribution;
    median(values: readonly number[]): number;
  };
}
