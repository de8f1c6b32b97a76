import { type AppError, alreadyThere } from '../../errors'

export function customerTaken(name: string): AppError {
  return alreadyThere('name', { key: 'customer.name.taken', params: { name } })
}
