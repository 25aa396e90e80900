/** Asks one question at a time; of those that come meanwhile only the last is asked next. */
export class LatestOnly<Ask> {
  private next: { readonly ask: Ask } | undefined
  private busy = false

  constructor(private readonly work: (ask: Ask) => Promise<void>) {}

  request(ask: Ask): void {
    this.next = { ask }
    if (!this.busy) void this.run()
  }

  private async run(): Promise<void> {
    this.busy = true
    while (this.next !== undefined) {
      const { ask } = this.next
      this.next = undefined
      await this.work(ask)
    }
    this.busy = false
  }
}
