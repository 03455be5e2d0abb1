/** More cases than there is time for at every change: `npm run test:long`. */
export const isLong = process.env['COAXWAIN_LONG'] === '1'

/** Prints something that is of interest even where all is well. */
export const tell = (text: string): void => void process.stdout.write(`\ntold: ${text}\n`)
