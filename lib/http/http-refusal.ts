/** A request that cannot be read at all: wrong type, too large, not JSON, a condition missing. */
export class HttpRefusal extends Error {
  override readonly name = "HttpRefusal";
  constructor(
    readonly status: 400 | 404 | 405 | 413 | 415 | 428 | 503,
    readonly title: string,
    detail: string,
  ) {
    super(detail);
  }
}
