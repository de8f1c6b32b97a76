import QRCode from 'qrcode'
import { inks } from './inks'
import { rectPath } from './paths'
import type { Sheet } from './sheet'

/** The address as a code to be scanned, in squares: runs of a row are drawn as one. */
export function drawCheckSquares(
  sheet: Sheet,
  box: { x: number; y: number; size: number },
  address: string,
): void {
  const { modules } = QRCode.create(address, { errorCorrectionLevel: 'M' })
  const each = box.size / modules.size
  const runs: string[] = []
  for (let row = 0; row < modules.size; row += 1) {
    for (let column = 0; column < modules.size; column += 1) {
      const start = column
      while (column < modules.size && modules.get(row, column)) column += 1
      if (column === start) continue
      runs.push(rectPath(box.x + start * each, box.y + row * each, (column - start) * each, each))
    }
  }
  sheet.path(runs.join(''), { fill: inks.ink })
}
