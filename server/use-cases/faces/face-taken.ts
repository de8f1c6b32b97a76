import { type AppError, alreadyThere } from '../../errors'

export function faceTaken(name: string): AppError {
  return alreadyThere('name', { key: 'face.name.taken', params: { name } })
}
