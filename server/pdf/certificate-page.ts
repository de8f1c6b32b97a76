import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { PageDescription } from '@shared/schemas/page-description'
import { roomiest } from './certificate/density'
import { drawEquipment } from './certificate/equipment-table'
import { drawExplanations } from './certificate/explanations'
import { drawFoot } from './certificate/foot'
import { drawFormWords } from './certificate/form-words'
import { inks } from './certificate/inks'
import { drawItemGrid } from './certificate/item-grid'
import { type MapSurface, mapSurface } from './certificate/map-lines'
import { drawMap } from './certificate/map-part'
import { pageHeightPt, pageWidth, pageWidthPt } from './certificate/paths'
import { drawPhotograph } from './certificate/photograph-part'
import { drawProfile } from './certificate/profile-part'
import { drawResult } from './certificate/result-part'
import { Sheet } from './certificate/sheet'
import { drawShopHead } from './certificate/shop-head'
import { words } from './certificate/words'
import type { Measure } from './measure-text'
import type { PagePicture } from './photograph'

export interface CertificatePictures {
  /** The whole photograph, at any size: it is laid by the snapshot's own pixels. */
  photo: PagePicture
  /** The map's colours over its whole grid. */
  map: PagePicture
}

/** Lowest baseline on the page, units: 9.5 mm above its edge. */
const lowest = 850

/** The certificate's page, A4: set as roomily as lets everything that it says stand on it. */
export function layoutCertificate(
  snapshot: CertificateSnapshot,
  pictures: CertificatePictures,
  measure: Measure,
): PageDescription {
  const content = { snapshot, pictures, surface: mapSurface(snapshot) }
  const sheet = roomiest((density) =>
    composed(content, new Sheet(measure, density), new Sheet(measure, density)),
  )
  if (!sheet) throw new Error(`Certificate ${snapshot.number} says more than a page holds`)
  return {
    widthPt: pageWidthPt,
    heightPt: pageHeightPt,
    title: words('pageTitle', {
      number: snapshot.number,
      part: snapshot.part.number,
      serial: snapshot.piece.serial,
    }),
    items: sheet.items,
  }
}

interface Content {
  snapshot: CertificateSnapshot
  pictures: CertificatePictures
  surface: MapSurface
}

/** Null where it doesn't fit. The foot is tried on a sheet of its own, since it stands by its lower end. */
function composed(content: Content, sheet: Sheet, trial: Sheet): Sheet | null {
  const bodyEnd = drawBody(sheet, content)
  const footTop = lowest - drawFoot(trial, 0, content.snapshot)
  if (bodyEnd + sheet.gap(14) > footTop) return null
  drawFoot(sheet, footTop, content.snapshot)
  return sheet
}

/** From the top down, each part below the one before. */
function drawBody(sheet: Sheet, { snapshot, pictures, surface }: Content): number {
  const headEnd = ruled(sheet, drawShopHead(sheet, snapshot) + sheet.gap(15), inks.ink, 1.3)
  const gridEnd = drawItemGrid(sheet, headEnd + sheet.gap(18), snapshot)
  const resultTop = ruled(sheet, gridEnd + sheet.gap(13)) + sheet.gap(17)
  const resultEnd = drawResult(sheet, resultTop, snapshot)
  const mapTop = ruled(sheet, resultEnd + sheet.gap(14)) + sheet.gap(17)
  const mapEnd = Math.max(
    drawPhotograph(sheet, mapTop, snapshot, pictures.photo),
    drawMap(sheet, mapTop, { snapshot, surface, colours: pictures.map }),
    drawFormWords(sheet, mapTop, snapshot),
  )
  const profileEnd = drawProfile(sheet, mapEnd + sheet.gap(18), snapshot, surface.field)
  const equipmentTop = ruled(sheet, profileEnd + sheet.gap(13)) + sheet.gap(17)
  const equipmentEnd = drawEquipment(sheet, equipmentTop, snapshot)
  return drawExplanations(sheet, equipmentEnd + sheet.gap(21), snapshot)
}

function ruled(sheet: Sheet, y: number, colour: string = inks.graduation, width = 0.8): number {
  sheet.line(0, y, pageWidth, y, { colour, width })
  return y
}
