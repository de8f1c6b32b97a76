import type { AppContext } from '../context'
import type { ApiRouter } from './api-router'
import { certificatesRouter } from './certificates'
import { customersRouter } from './customers'
import { equipmentRouter } from './equipment'
import { eventsRouter } from './events'
import { healthRouter } from './health'
import { homeRouter } from './home'
import { lotsRouter } from './lots'
import { partsRouter } from './parts'
import { peopleRouter } from './people'
import { photosRouter } from './photos'
import { piecesRouter } from './pieces'
import { readingsRouter } from './readings'
import { reviewsRouter } from './reviews'
import { searchRouter } from './search'
import { sessionRouter } from './session'
import { settingsRouter } from './settings'

/** Every router of the API. */
export function apiRouters(context: AppContext): ApiRouter[] {
  return [
    healthRouter(context),
    sessionRouter(context),
    peopleRouter(context),
    settingsRouter(context),
    customersRouter(context),
    partsRouter(context),
    lotsRouter(context),
    piecesRouter(context),
    equipmentRouter(context),
    readingsRouter(context),
    reviewsRouter(context),
    certificatesRouter(context),
    photosRouter(context),
    homeRouter(context),
    searchRouter(context),
    eventsRouter(context),
  ]
}
