import { checkArrangement, checkChain, checkProofs } from '@coaxwain/checker'
import type { Mode } from '@coaxwain/contract'
import type { Store } from 'express-session'
import type { Knex } from 'knex'
import type { Logger } from 'pino'
import { answerRoutes } from './answers/routes'
import { createAnswersService, type Checker, type Matcher, type OnRefusal } from './answers/service'
import { arrangementRoutes } from './arrangements/routes'
import { createArrangementsService, type ArrangementChecker } from './arrangements/service'
import { createCollectionsRepository } from './collections/repository'
import { collectionRoutes } from './collections/routes'
import { createCollectionsService, type CollectionsService } from './collections/service'
import { createSignInLimits } from './db/limits'
import { SessionStore } from './db/session-store'
import { together } from './db/transact'
import { createHealthRepository } from './health/repository'
import { createHealthService, type HealthService } from './health/service'
import { hookupCheckRoutes } from './hookup-checks/routes'
import { createHookupChecksService } from './hookup-checks/service'
import { createHookupsRepository } from './hookups/repository'
import { hookupRoutes } from './hookups/routes'
import { createHookupsService } from './hookups/service'
import type { AllHandlers } from './http/call'
import { findArrangements, findProofs, withOrdinaryParts } from './matcher'
import { createModelsRepository } from './models/repository'
import { modelRoutes } from './models/routes'
import { createModelsService } from './models/service'
import { createPasswords } from './people/passwords'
import { createPeopleRepository } from './people/repository'
import { peopleRoutes } from './people/routes'
import { createPeopleService, type PeopleService } from './people/service'
import { createPlacesRepository } from './places/repository'
import { placeRoutes } from './places/routes'
import { createPlacesService } from './places/service'
import { proofRoutes } from './proofs/routes'
import { createProofsService, type ProofChecker } from './proofs/service'
import { createSnapshotRepository } from './snapshot/repository'
import { snapshotRoutes } from './snapshot/routes'
import { createSnapshotService } from './snapshot/service'
import { createUnitsRepository } from './units/repository'
import { unitRoutes } from './units/routes'
import { createUnitsService } from './units/service'

export interface ComposeNeeds {
  readonly db: Knex
  readonly mode: Mode
  readonly matcher: Matcher
  readonly checker: Checker
  readonly arrangementChecker?: ArrangementChecker | undefined
  readonly proofChecker?: ProofChecker | undefined
  readonly logger: Logger
}

export interface Services {
  readonly handlers: AllHandlers
  readonly people: PeopleService
  readonly collections: CollectionsService
  readonly health: HealthService
  readonly sessionStore: Store
}

const today = (): string => new Date().toISOString().slice(0, 10)

/** The one place where repositories, services and routes are put together. */
export async function compose({
  db,
  mode,
  matcher,
  checker,
  arrangementChecker = checkArrangement,
  proofChecker = checkProofs,
  logger,
}: ComposeNeeds): Promise<Services> {
  const people = createPeopleService({
    people: createPeopleRepository(db),
    passwords: await createPasswords(),
    limits: createSignInLimits(db),
    mode,
  })
  const collections = createCollectionsService(createCollectionsRepository(db))
  const places = createPlacesService(
    createPlacesRepository(db),
    together(db, createPlacesRepository),
  )
  const models = createModelsService(
    createModelsRepository(db),
    together(db, createModelsRepository),
  )
  const units = createUnitsService({
    units: createUnitsRepository(db),
    inOne: together(db, createUnitsRepository),
    models,
    places,
    today,
  })
  const snapshots = createSnapshotService({
    versions: createSnapshotRepository(db),
    units,
    models,
  })
  const onRefusal: OnRefusal = (refused) => logger.error({ refused }, 'the check refused an answer')
  const answers = createAnswersService({
    snapshots,
    findHookups: matcher,
    withParts: withOrdinaryParts,
    checkHookup: checker,
    onRefusal,
  })
  const arrangements = createArrangementsService({
    snapshots,
    arrange: findArrangements,
    checkArrangement: arrangementChecker,
    onRefusal,
  })
  const proofs = createProofsService({
    snapshots,
    prove: findProofs,
    checkProofs: proofChecker,
    onRefusal,
  })
  const hookups = createHookupsService({
    hookups: createHookupsRepository(db),
    inOne: together(db, createHookupsRepository),
    snapshots,
    checkHookup: checker,
  })
  return {
    handlers: {
      ...peopleRoutes(people),
      ...collectionRoutes(collections),
      ...placeRoutes(places),
      ...modelRoutes(models),
      ...unitRoutes(units),
      ...snapshotRoutes(snapshots),
      ...answerRoutes(answers),
      ...arrangementRoutes(arrangements),
      ...proofRoutes(proofs),
      ...hookupCheckRoutes(createHookupChecksService({ snapshots, checkChain })),
      ...hookupRoutes(hookups),
    },
    people,
    collections,
    health: createHealthService(createHealthRepository(db)),
    sessionStore: new SessionStore(db, (error) => {
      logger.warn({ err: error }, 'expired sessions could not be removed')
    }),
  }
}
