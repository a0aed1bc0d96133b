// How a fit of layers ended, in words.

/** Words for the outcome of a fit; an outcome without words of its own stands as it is. */
export function fitEnding(outcome: string): string {
  switch (outcome) {
    case 'converged':
      return 'converged';
    case 'at-bound':
      return 'converged with a layer at a bound of what was tried';
    case 'stalled':
      return 'STALLED before its least misfit was found';
    case 'limit':
      return 'STOPPED at the limit of steps before its least misfit was found';
    default:
      return outcome;
  }
}
