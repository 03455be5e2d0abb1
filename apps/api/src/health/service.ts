import type { HealthRepository } from './repository'

export type HealthService = ReturnType<typeof createHealthService>

/** Whether requests should be sent here: not while stopping, nor without a database of the right shape. */
export function createHealthService(health: HealthRepository) {
  let stopping = false
  let migrated = false
  return {
    stop(): void {
      stopping = true
    },
    async isReady(): Promise<boolean> {
      if (stopping) return false
      try {
        // The schema does not go backwards under a running server, so once is enough.
        migrated ||= (await health.pendingMigrations()).length === 0
        return migrated && (await health.answers())
      } catch {
        return false
      }
    },
  }
}
