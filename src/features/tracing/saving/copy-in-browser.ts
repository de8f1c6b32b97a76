import { type SaveMarks, saveMarksSchema } from '@shared/schemas/readings'
import type { CopyHere } from './autosave'

const keyOf = (readingId: string) => `lapwing.marks.${readingId}`

/** Keeps unsaved marks in this browser. A full or forbidden store is no reason to stop work: the server has the rest. */
export function copyInBrowser(readingId: string, storage: Storage = localStorage): CopyHere {
  return {
    keep: (unsaved) => {
      try {
        storage.setItem(keyOf(readingId), JSON.stringify(unsaved))
      } catch {
        // The next acknowledged save makes it good.
      }
    },
    forget: () => {
      try {
        storage.removeItem(keyOf(readingId))
      } catch {
        // As above.
      }
    },
  }
}

/** Marks that were never acknowledged, from an earlier visit; null where there are none that can be read. */
export function readCopy(readingId: string, storage: Storage = localStorage): SaveMarks | null {
  try {
    const text = storage.getItem(keyOf(readingId))
    if (text === null) return null
    const parsed = saveMarksSchema.safeParse(JSON.parse(text))
    return parsed.success ? parsed.data : null
  } catch {
    return null
  }
}
