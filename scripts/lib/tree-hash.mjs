import { createHash } from 'node:crypto'
import { readdirSync, readFileSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { inRoot } from './paths.mjs'

const SKIPPED = new Set(['node_modules', 'dist', '.data', '.cache', '.git', 'coverage'])

function addTo(hash, path) {
  const full = inRoot(path)
  const stat = statSync(full, { throwIfNoEntry: false })
  if (!stat) return
  if (stat.isDirectory()) {
    for (const name of readdirSync(full).sort()) {
      if (!SKIPPED.has(name)) addTo(hash, join(path, name))
    }
    return
  }
  if (path.endsWith('.test.ts')) return
  hash.update(`${path}\0${stat.size}\0`).update(readFileSync(full))
}

/** Fingerprint of everything under some paths, names and contents. */
export function treeHash(paths) {
  const hash = createHash('sha256').update(process.version)
  for (const path of paths) addTo(hash, path)
  return hash.digest('hex')
}
