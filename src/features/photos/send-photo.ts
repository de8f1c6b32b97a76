import { type Photo, photoSchema } from '@shared/schemas/readings'
import { failureOf } from '@/lib/api-client'
import { ApiFailure } from '@/lib/api-failure'
import { i18n } from '@/lib/i18n'

export interface Sending {
  /** Rejects with ApiFailure; with code `cancelled` when it was cancelled. */
  done: Promise<Photo>
  cancel: () => void
}

/** Sends one photograph. Not by fetch, which tells nothing of how far an upload has come. */
export function sendPhoto(
  readingId: string,
  file: File,
  role: Photo['role'],
  onProgress: (share: number) => void,
): Sending {
  const request = new XMLHttpRequest()
  const done = new Promise<Photo>((resolve, reject) => {
    request.upload.onprogress = ({ loaded, total }) => onProgress(total > 0 ? loaded / total : 0)
    request.upload.onload = () => onProgress(1)
    request.onerror = () =>
      reject(new ApiFailure({ code: 'unreachable', status: 0, message: i18n.t('common:unreachable') }))
    request.onabort = () => reject(new ApiFailure({ code: 'cancelled', status: 0, message: '' }))
    request.onload = () => {
      const { status, responseText } = request
      const parsed = status < 300 ? photoSchema.safeParse(JSON.parse(responseText)) : null
      if (parsed?.success) resolve(parsed.data)
      else reject(failureOf(status, responseText))
    }
  })
  request.open('POST', `/api/readings/${readingId}/photos`)
  request.send(bodyOf(file, role))
  return { done, cancel: () => request.abort() }
}

function bodyOf(file: File, role: Photo['role']): FormData {
  const body = new FormData()
  // Fields before the file: the server reads them in this order.
  body.append('role', role)
  body.append('photo', file, file.name)
  return body
}
