import type { Request, RequestHandler } from 'express'
import multer, { MulterError, type StorageEngine } from 'multer'
import { AppError } from '../errors'
import { mostBytes } from '../storage/photo-limits'
import type { PhotoStorage, ReceivedFile } from '../storage/photo-storage'

declare global {
  namespace Express {
    namespace Multer {
      interface File {
        received?: ReceivedFile
      }
    }
  }
}

/** Room for the form round the file. */
const formBytes = 64 * 1024

/** Streams the one file of the field `photo` to the storage's temporary place, and refuses what is too large. */
export function receivePhoto(storage: PhotoStorage): RequestHandler {
  const limits = { fileSize: mostBytes, files: 1, fields: 10, fieldSize: 1024, parts: 12 }
  const receive = multer({ storage: engineFor(storage), limits, defParamCharset: 'utf8' }).single('photo')
  return (request, response, next) => {
    if (Number(request.get('content-length')) > mostBytes + formBytes) return next(tooLarge())
    receive(request, response, (error: unknown) => {
      const received = request.file?.received
      // Whatever becomes of the request: nothing happens here to a file that was kept.
      if (received) response.once('close', () => void storage.discard(received))
      next(asRefusal(error))
    })
  }
}

/** The file that was received, if there is one. */
export function requireReceived(request: Request): { received: ReceivedFile; fileName: string } {
  const { file } = request
  if (!file?.received) {
    throw new AppError('invalidInput', { fields: { photo: { key: 'photo.missing' } } })
  }
  return { received: file.received, fileName: file.originalname.slice(-200) }
}

function engineFor(storage: PhotoStorage): StorageEngine {
  return {
    _handleFile: (_request, file, done) => {
      storage.receive(file.stream).then((received) => done(null, { received, path: received.path }), done)
    },
    _removeFile: (_request, file, done) => {
      const { received } = file
      const removed = received ? storage.discard(received) : Promise.resolve()
      removed.then(() => done(null), done)
    },
  }
}

function asRefusal(error: unknown): unknown {
  if (!(error instanceof MulterError)) return isBrokenForm(error) ? brokenForm(error) : error
  switch (error.code) {
    case 'LIMIT_FILE_SIZE':
      return tooLarge()
    case 'LIMIT_FILE_COUNT':
    case 'LIMIT_UNEXPECTED_FILE':
      return new AppError('invalidInput', { fields: { photo: { key: 'photo.onlyOne' } }, log: error.message })
    default:
      return new AppError('invalidInput', { say: { key: 'body.invalidInput' }, log: error.message })
  }
}

/** busboy's own complaints about a form that ends too early or has no boundary. */
function isBrokenForm(error: unknown): error is Error {
  return (
    error instanceof Error &&
    /^(Unexpected end of form|Malformed|Multipart|Request aborted)/.test(error.message)
  )
}

function brokenForm(error: Error): AppError {
  return new AppError('invalidInput', { say: { key: 'body.invalidInput' }, log: error.message })
}

function tooLarge(): AppError {
  return new AppError('tooLarge', {
    say: { key: 'photo.tooLarge', params: { most: mostBytes / 1024 / 1024 } },
  })
}
