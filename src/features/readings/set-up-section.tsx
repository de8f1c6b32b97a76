import type { Equipment } from '@shared/schemas/equipment'
import type { Reading } from '@shared/schemas/readings'
import { formatHeight } from '@shared/units/height'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { Facts } from '@/components/facts'
import { Section } from '@/components/section'
import { useEquipment } from '@/lib/queries/equipment'

interface Props {
  reading: Reading
  /** Opens the change of set-up and conditions, for who may. */
  change?: ReactNode
}

export function SetUpSection({ reading: { setUp }, change }: Props) {
  const { t } = useTranslation('readings')
  const equipment = useEquipment()
  const named = (id: string | null) => nameOf(equipment.data?.rows ?? [], id) ?? t('common:notStated')
  const camera = equipment.data?.rows.find(({ id }) => id === setUp.cameraSetUpId)?.details
  const ofCamera = setUp.viewingAngleDeg === null && camera?.kind === 'cameraSetUp' ? camera : null
  const angle = ofCamera
    ? t('page.setUp.ofCamera', { angle: angleWords(ofCamera.viewingAngleDeg, ofCamera.viewingAngleUDeg) })
    : setUp.viewingAngleDeg === null
      ? t('common:notStated')
      : angleWords(setUp.viewingAngleDeg, setUp.viewingAngleUDeg)
  return (
    <Section title={t('page.setUp.title')}>
      <div className="flex flex-wrap items-start justify-between gap-4 pt-3">
        <Facts
          facts={[
            { name: t('page.setUp.lightSource'), value: named(setUp.lightSourceId) },
            { name: t('page.setUp.referenceFlat'), value: named(setUp.referenceFlatId) },
            { name: t('page.setUp.cameraSetUp'), value: named(setUp.cameraSetUpId) },
            { name: t('page.setUp.thermometer'), value: named(setUp.thermometerId) },
            { name: t('page.setUp.viewingAngle'), value: angle },
            { name: t('page.setUp.mirrored'), value: t(setUp.mirrored ? 'page.setUp.yes' : 'page.setUp.no') },
          ]}
        />
        {change}
      </div>
    </Section>
  )
}

function angleWords(deg: number, uDeg: number | null): string {
  return uDeg === null ? `${deg}°` : `${deg}° ± ${uDeg}°`
}

function nameOf(rows: readonly Equipment[], id: string | null): string | undefined {
  const found = id === null ? undefined : rows.find((row) => row.id === id)
  if (!found) return undefined
  return found.details.kind === 'lightSource' ? `${found.name}, ${found.details.wavelengthNm} nm` : found.name
}

export function ConditionsSection({ reading: { conditions } }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const stated = (value: number | null, words: (value: number) => string) =>
    value === null ? t('common:notStated') : words(value)
  const celsius = (value: number) => `${value} °C`
  const um = (value: number) => formatHeight(value, 'um', { decimals: 3 })
  return (
    <Section title={t('page.conditions.title')}>
      <div className="pt-3">
        <Facts
          facts={[
            { name: t('page.conditions.air'), value: stated(conditions.airTemperatureC, celsius) },
            { name: t('page.conditions.part'), value: stated(conditions.partTemperatureC, celsius) },
            {
              name: t('page.conditions.soak'),
              value: stated(conditions.soakMinutes, (value) => `${value} min`),
            },
            { name: t('page.conditions.gradient'), value: stated(conditions.temperatureHalfWidthUm, um) },
            { name: t('page.conditions.gap'), value: stated(conditions.meanGapUm, um) },
            { name: t('page.conditions.support'), value: stated(conditions.supportHalfWidthUm, um) },
            {
              name: t('page.conditions.placement'),
              value: stated(conditions.edgePlacementUMm, (value) => `${value} mm`),
            },
            {
              name: t('page.conditions.repeats'),
              value: conditions.repeats
                ? t('page.conditions.repeatsValue', {
                    spread: um(conditions.repeats.standardDeviationUm),
                    count: conditions.repeats.count,
                  })
                : t('common:notStated'),
            },
          ]}
        />
        {conditions.note && <p className="mt-3 max-w-[70ch] whitespace-pre-line">{conditions.note}</p>}
      </div>
    </Section>
  )
}
