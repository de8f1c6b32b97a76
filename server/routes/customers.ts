import { newCustomerSchema } from '@shared/schemas/parts'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { addCustomer } from '../use-cases/customers/add-customer'
import { changeCustomer } from '../use-cases/customers/change-customer'
import { listCustomers } from '../use-cases/customers/list-customers'
import { ApiRouter } from './api-router'
import { parseChange, parseInput } from './parse'

export function customersRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/customers', 'shop:read', (_request, response) => {
    response.json({ rows: listCustomers(context) })
  })

  api.post('/customers', 'part:edit', (request, response) => {
    const input = parseInput(newCustomerSchema, request.body)
    response.status(201).json(addCustomer(context, requireActor(request), input))
  })

  api.patch('/customers/:id', 'part:edit', (request, response) => {
    const change = parseChange(newCustomerSchema, request.body)
    response.json(changeCustomer(context, requireActor(request), request.params.id, change))
  })

  return api
}
