import {
  certificateListQuerySchema,
  issueCertificateSchema,
  withdrawCertificateSchema,
} from '@shared/schemas/certificates'
import type { Request } from 'express'
import { rateLimit } from 'express-rate-limit'
import { requireActor } from '../auth/actor'
import { addressKey } from '../auth/address'
import type { AppContext } from '../context'
import { AppError } from '../errors'
import { checkCertificate } from '../use-cases/certificates/check-certificate'
import { exportCertificates } from '../use-cases/certificates/export-certificates'
import { issueCertificate } from '../use-cases/certificates/issue-certificate'
import {
  listCertificates,
  readCertificatePdf,
  showCertificate,
  showCertificatePage,
} from '../use-cases/certificates/show-certificate'
import { withdrawCertificate } from '../use-cases/certificates/withdraw-certificate'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'
import { sendCsv } from './send-csv'

/** Checks of a code from one address: a person with a stack of paper stays below, a guesser gets nowhere. */
const checksPerWindow = 60
const checkWindowMinutes = 15

export function certificatesRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/certificates', 'shop:read', (request, response) => {
    response.json(listCertificates(context, parseInput(certificateListQuerySchema, request.query)))
  })

  api.get('/certificates.csv', 'shop:read', (request, response) => {
    const query = parseInput(certificateListQuerySchema, request.query)
    sendCsv(response, 'certificates', exportCertificates(context, query))
  })

  api.get('/certificates/:id', 'shop:read', (request, response) => {
    response.json(showCertificate(context, request.params.id))
  })

  api.get('/certificates/:id/page', 'shop:read', async (request, response) => {
    response.json(await showCertificatePage(context, request.params.id))
  })

  api.get('/certificates/:id/pdf', 'shop:read', (request, response) => {
    const { number, pdf } = readCertificatePdf(context, request.params.id)
    response
      .type('pdf')
      .set('Content-Disposition', `inline; filename="${number}.pdf"`)
      .set('Cache-Control', 'private, no-cache')
      .send(pdf)
  })

  api.post('/readings/:id/certificate', 'certificate:issue', async (request, response) => {
    const input = parseInput(issueCertificateSchema, request.body)
    const from = { address: addressKey(request.ip), origin: originOf(request) }
    const { id } = request.params
    response.status(201).json(await issueCertificate(context, requireActor(request), id, input, from))
  })

  api.post('/certificates/:id/withdraw', 'certificate:issue', async (request, response) => {
    const input = parseInput(withdrawCertificateSchema, request.body)
    const address = addressKey(request.ip)
    const actor = requireActor(request)
    response.json(await withdrawCertificate(context, actor, request.params.id, input, address))
  })

  api.get('/check/:code', 'anyone', limitedChecks(), (request, response) => {
    response.set('Cache-Control', 'no-store').json(checkCertificate(context, request.params.code))
  })

  return api
}

function limitedChecks() {
  return rateLimit({
    windowMs: checkWindowMinutes * 60_000,
    limit: checksPerWindow,
    standardHeaders: true,
    legacyHeaders: false,
    handler: () => {
      throw new AppError('tooManyAttempts', {
        say: { key: 'tooManyChecks', params: { minutes: checkWindowMinutes } },
        retryAfterS: checkWindowMinutes * 60,
      })
    },
  })
}

function originOf(request: Pick<Request, 'protocol'> & { get(name: 'host'): string | undefined }): string {
  return `${request.protocol}://${request.get('host') ?? 'localhost'}`
}
