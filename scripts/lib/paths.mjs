import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

export const ROOT = dirname(dirname(dirname(fileURLToPath(import.meta.url))))
export const inRoot = (...parts) => join(ROOT, ...parts)
export const DATA = process.env.COAXWAIN_DATA ?? inRoot('.data')

export function readJson(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'))
  } catch (error) {
    if (error.code === 'ENOENT' || error instanceof SyntaxError) return null
    throw error
  }
}

/** Whole or not at all, and for nobody else's eyes. */
export function writePrivateJson(file, value) {
  mkdirSync(dirname(file), { recursive: true })
  const fresh = `${file}.new`
  writeFileSync(fresh, `${JSON.stringify(value, null, 2)}\n`, { mode: 0o600 })
  renameSync(fresh, file)
}
