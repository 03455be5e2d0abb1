import { spawn } from 'node:child_process'
import { readFileSync } from 'node:fs'

export const wait = (ms) => new Promise((resolve) => setTimeout(resolve, ms))

/** Runs a command to its end; its output goes to the terminal unless `quiet`. */
export function run(command, args, options = {}) {
  const { quiet = false, ...rest } = options
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: quiet ? 'pipe' : 'inherit', ...rest })
    const output = []
    child.stdout?.on('data', (chunk) => output.push(chunk))
    child.stderr?.on('data', (chunk) => output.push(chunk))
    child.once('error', reject)
    child.once('close', (status, signal) =>
      resolve({ status: status ?? 1, signal, output: Buffer.concat(output).toString() }),
    )
  })
}

/** The command line of a living process, or null. A dead child that nobody has waited for has none. */
export function commandLine(pid) {
  try {
    const line = readFileSync(`/proc/${pid}/cmdline`, 'utf8')
    return line === '' ? null : line.split('\0')
  } catch {
    return null
  }
}

/** Asks a process to end and waits; after the time is up it is killed. */
export async function endProcess(pid, patienceMs = 15_000) {
  const until = Date.now() + patienceMs
  try {
    process.kill(pid, 'SIGTERM')
  } catch {
    return
  }
  while (commandLine(pid)) {
    if (Date.now() > until) {
      process.kill(pid, 'SIGKILL')
      return
    }
    await wait(20)
  }
}
