/** The part of ml-regression that the engine uses; the package ships no types. */
declare module 'ml-regression' {
  export class SimpleLinearRegression {
    constructor(x: readonly number[], y: readonly number[]);
    readonly slope: number;
    readonly intercept: number;
    predict(x: number): number;
  }
}
