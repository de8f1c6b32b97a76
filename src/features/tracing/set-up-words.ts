import type { Equipment } from '@shared/schemas/equipment'
import type { Reading } from '@shared/schemas/readings'
import type { TFunction } from 'i18next'

/** Reading, light and flat in a few words for the top bar. */
export function setUpWords(
  t: TFunction<'table'>,
  reading: Reading,
  equipment: readonly Equipment[],
): string[] {
  const named = (id: string | null) => equipment.find((item) => item.id === id)
  const light = named(reading.setUp.lightSourceId)
  const flat = named(reading.setUp.referenceFlatId)
  return [
    t('reading', { number: reading.number, state: t(`common:state.${reading.state}`) }),
    light?.details.kind === 'lightSource'
      ? t('wavelength', { name: light.name, wavelength: (light.details.wavelengthNm / 1000).toFixed(4) })
      : t('noLight'),
    ...(flat ? [flat.name] : []),
  ]
}
