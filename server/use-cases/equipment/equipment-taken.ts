import { type AppError, alreadyThere } from '../../errors'

export function equipmentTaken(name: string): AppError {
  return alreadyThere('name', { key: 'equipment.name.taken', params: { name } })
}
