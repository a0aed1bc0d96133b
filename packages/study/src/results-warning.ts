// Something said in words with the results: an assumption or a doubt of engineering.

export interface ResultsWarning {
  /** stable word for programs */
  readonly code: string;
  readonly message: string;
}
