import type { PageWeight } from '@shared/schemas/page-description'
import { type FontName, fontFiles } from './fonts'

export interface FontRun {
  font: FontName
  text: string
}

/** What people type that Source Sans 3 has in none of its files. */
const spelled: Record<string, string> = { '≤': '<=', '≥': '>=', '→': '->', '←': '<-', '≈': '~', '\t': ' ' }
const unknown = '?'

/** A text parted into stretches of one font file each; a character that no file has is spelled out or shown as "?". */
export function fontRuns(text: string, weight: PageWeight): FontRun[] {
  const files = fontFiles(weight)
  const runs: FontRun[] = []
  for (const character of printable(text.normalize('NFC'), weight)) {
    const last = runs.at(-1)
    const file = files.find(({ has }) => has(character.codePointAt(0)!))
    // A space keeps to the word before it, so that words stay whole for whoever copies them.
    const font = last && character === ' ' ? last.font : (file?.name ?? files[0].name)
    if (last?.font === font) last.text += character
    else runs.push({ font, text: character })
  }
  return runs
}

function printable(text: string, weight: PageWeight): string {
  const files = fontFiles(weight)
  const isKnown = (character: string) => files.some(({ has }) => has(character.codePointAt(0)!))
  return Array.from(text, (character) => {
    if (isKnown(character)) return character
    return spelled[character] ?? Array.from(character.normalize('NFD')).find(isKnown) ?? unknown
  }).join('')
}
