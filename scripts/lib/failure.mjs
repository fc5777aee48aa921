/** A failure that is told as one sentence and what to do about it; anything else that is thrown is a fault of ours and shows its stack. */
export class Failure extends Error {
  /**
   * @param {string} sentence what happened
   * @param {{ todo?: string, log?: string, output?: string, cause?: unknown }} [more] what to do, and the log file or output that shows why
   */
  constructor(sentence, { todo, log, output, cause } = {}) {
    super(sentence, { cause })
    this.name = 'Failure'
    this.todo = todo
    this.log = log
    this.output = output
  }
}
