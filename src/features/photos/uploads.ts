import type { Photo } from '@shared/schemas/readings'

export type UploadState =
  | { kind: 'waiting' }
  /** `share` 1 is all sent; the server is looking at it. */
  | { kind: 'sending'; share: number }
  | { kind: 'kept'; photo: Photo }
  | { kind: 'failed'; sentence: string }
  | { kind: 'cancelled' }

export interface Upload {
  key: number
  file: File
  role: Photo['role']
  state: UploadState
}

export type UploadAction =
  | { type: 'add'; uploads: Upload[] }
  | { type: 'set'; key: number; state: UploadState }

export function uploadsReducer(uploads: Upload[], action: UploadAction): Upload[] {
  switch (action.type) {
    case 'add':
      return [...uploads, ...action.uploads]
    case 'set':
      return uploads.map((upload) =>
        upload.key === action.key ? { ...upload, state: action.state } : upload,
      )
  }
}

export function isUnderway({ state }: Upload): boolean {
  return state.kind === 'waiting' || state.kind === 'sending'
}
