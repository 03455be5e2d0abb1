export function wait(ms: number): Promise<void>
export function endProcess(pid: number, patienceMs?: number): Promise<void>
export function commandLine(pid: number): string[] | null
