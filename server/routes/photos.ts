import { photoSchema } from '@shared/schemas/readings'
import { z } from 'zod'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { addPhoto } from '../use-cases/photos/add-photo'
import { findPreview } from '../use-cases/photos/find-preview'
import { removePhoto } from '../use-cases/photos/remove-photo'
import { requireEditableReading } from '../use-cases/readings/reading-record'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'
import { receivePhoto, requireReceived } from './receive-photo'

const uploadFieldsSchema = z.object({ role: photoSchema.shape.role.default('bands') })
const previewQuerySchema = z.object({
  width: z
    .union([z.literal('full'), z.coerce.number().pipe(z.literal([160, 640, 1280, 2048]))])
    .default(1280),
})

/** What a photograph holds never changes under its name. `private`: it is for who is signed in. */
const forGood = 'private, max-age=31536000, immutable'

export function photosRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.post(
    '/readings/:id/photos',
    'photo:upload',
    // Before the first byte is taken: 60 MB for nothing are a long wait on a tablet.
    (request, _response, next) => {
      requireEditableReading(context.db, requireActor(request), request.params.id)
      next()
    },
    receivePhoto(context.storage),
    async (request, response) => {
      const { received, fileName } = requireReceived(request)
      const { role } = parseInput(uploadFieldsSchema, request.body)
      const photo = { file: received, fileName, role }
      response.status(201).json(await addPhoto(context, requireActor(request), request.params.id, photo))
    },
  )

  api.delete('/readings/:id/photos/:photoId', 'photo:upload', (request, response) => {
    removePhoto(context, requireActor(request), request.params.id, request.params.photoId)
    response.status(204).end()
  })

  api.get('/photos/:sha256/preview', 'shop:read', async (request, response) => {
    const { width } = parseInput(previewQuerySchema, request.query)
    const file = await findPreview(context, request.params.sha256, width)
    response.set('Cache-Control', forGood).type('image/jpeg')
    response.sendFile(file, { cacheControl: false, etag: false, lastModified: false, dotfiles: 'allow' })
  })

  return api
}
