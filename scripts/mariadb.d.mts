export interface PrivateServer {
  readonly host: string
  readonly port: number
  readonly user: string
  readonly password: string
  readonly database: string
  readonly pid: number
  readonly log: string
  stop(): Promise<void>
}

export function startMariadb(options: {
  folder: string
  disposable?: boolean
  tests?: boolean
  onPortTaken?: (port: number) => void
}): Promise<PrivateServer>
