import { bandHeightUm } from '@shared/metrology'
import type { Equipment } from '@shared/schemas/equipment'
import { formatHeight } from '@shared/units/height'
import type { TFunction } from 'i18next'
import type { Fact } from '@/components/facts'

/** What is told of a piece of equipment, by its kind. */
export function equipmentFacts({ details }: Equipment, t: TFunction<'equipment'>): Fact[] {
  const stated = (value: number | null, words: (value: number) => string) =>
    value === null ? t('common:notStated') : words(value)
  const um = (value: number) => formatHeight(value, 'um', { decimals: 3 })
  switch (details.kind) {
    case 'lightSource':
      return [
        { name: t('facts.wavelength'), value: `${details.wavelengthNm} nm` },
        {
          name: t('facts.relativeU'),
          value: stated(details.relativeU, (u) => `${Number((u * 100).toPrecision(3))} %`),
        },
        {
          name: t('facts.band'),
          value: formatHeight(bandHeightUm(details.wavelengthNm, 0), 'um', { decimals: 4 }),
        },
        { name: t('facts.lamp'), value: t(`lamps.${details.lamp}`) },
      ]
    case 'referenceFlat':
      return [
        { name: t('facts.diameter'), value: `${details.diameterMm} mm` },
        { name: t('facts.form'), value: stated(details.formUm, um) },
        { name: t('facts.expandedU'), value: stated(details.expandedUUm, um) },
      ]
    case 'cameraSetUp':
      return [
        {
          name: t('facts.viewingAngle'),
          value: `${details.viewingAngleDeg}°${details.viewingAngleUDeg === null ? '' : ` ± ${details.viewingAngleUDeg}°`}`,
        },
        { name: t('facts.distance'), value: stated(details.distanceMm, (mm) => `${mm} mm`) },
        { name: t('facts.mirrored'), value: t(details.mirrored ? 'mirroredYes' : 'mirroredNo') },
      ]
    case 'thermometer':
      return [{ name: t('facts.thermometerU'), value: stated(details.uC, (u) => `${u} °C`) }]
  }
}
