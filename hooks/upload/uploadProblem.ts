/**
 * Why a file did not arrive. `network`: nothing was heard, it is tried again by itself; `busy`: the server asks to wait
 * or had a fault of its own, it is tried again a few times; `refused`: trying again changes nothing.
 */
export class UploadProblem extends Error {
  constructor(
    readonly kind: 'network' | 'busy' | 'refused',
    message: string,
  ) {
    super(message);
    this.name = 'UploadProblem';
  }
}
