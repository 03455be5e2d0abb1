/** Progress goes to the terminal as plain lines; nothing here is needed by a program. */
export const say = (text) => process.stdout.write(`${text}\n`)

export const complain = (text) => process.stderr.write(`${text}\n`)

export const seconds = (since) => ((Date.now() - since) / 1000).toFixed(1)

/** Ends the script with a reason that a person can act on. */
export class Stop extends Error {
  constructor(message, status = 1) {
    super(message)
    this.status = status
  }
}
