import { newPersonSchema, personChangeSchema } from '@shared/schemas/people'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { addPerson } from '../use-cases/people/add-person'
import { changePerson } from '../use-cases/people/change-person'
import { listPeople } from '../use-cases/people/list-people'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'

export function peopleRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/people', 'person:read', (_request, response) => {
    response.json({ rows: listPeople(context) })
  })

  api.post('/people', 'person:manage', async (request, response) => {
    const input = parseInput(newPersonSchema, request.body)
    response.status(201).json(await addPerson(context, requireActor(request), input))
  })

  api.patch('/people/:id', 'person:manage', async (request, response) => {
    const input = parseInput(personChangeSchema, request.body)
    response.json(await changePerson(context, requireActor(request), request.params.id, input))
  })

  return api
}
