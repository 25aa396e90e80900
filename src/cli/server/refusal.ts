/** A request that is not answered as asked; the message goes to the page. */
export class Refusal extends Error {
  constructor(
    readonly status: number,
    message: string,
  ) {
    super(message)
    this.name = 'Refusal'
  }
}
