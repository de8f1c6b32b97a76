import type { Reading } from '@shared/schemas/readings'
import type { Review } from '@shared/schemas/reviews'
import type { TFunction } from 'i18next'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import { findingWords } from '@/lib/finding-words'
import { formatDay } from '@/lib/format-when'
import { useEquipment } from '@/lib/queries/equipment'
import { equipmentTroubles, leftOut, othersThatCount } from './look-at'
import { summariseResiduals } from './residuals'

interface Row {
  name: string
  value: ReactNode
  isGrave: boolean
}

/** What a reviewer must see without looking for it. What needs a second thought stands in chestnut. */
export function LookAtList({ reading, review }: { reading: Reading; review: Review }) {
  const { t } = useTranslation('review')
  const equipment = useEquipment()
  const troubles = equipmentTroubles(reading, equipment.data?.rows ?? [])
  const rows: Row[] = [
    ...departureRows(t, reading, review),
    leftOutRow(t, reading),
    supportedRow(t, reading),
    residualRow(t, reading),
    pressRow(t, reading),
    conditionsRow(t, reading),
    {
      name: t('look.equipment'),
      isGrave: troubles.length > 0,
      value:
        troubles.length === 0
          ? t('look.equipmentFine')
          : troubles.map(({ kind, name, day }) => (
              <span key={name} className="block">
                {t(`look.${kind}`, { name, day: day && formatDay(day) })}
              </span>
            )),
    },
    notStatedRow(t, reading),
    findingsRow(t, reading),
    othersRow(t, reading, review),
  ]
  return (
    <section aria-label={t('look.title')}>
      <h3 className="text-section">{t('look.title')}</h3>
      <dl>
        {rows.map(({ name, value, isGrave }) => (
          <div
            key={name}
            className="grid grid-cols-[8.5rem_minmax(0,1fr)] gap-x-3 border-hairline border-t py-1 first:border-t-0"
          >
            <dt className="text-muted text-second">{name}</dt>
            <dd className={classNames('text-second', isGrave && 'text-chestnut')}>{value}</dd>
          </div>
        ))}
      </dl>
    </section>
  )
}

type Words = TFunction<'review'>

function departureRows(t: Words, reading: Reading, { departures, departureReason }: Review): Row[] {
  return departures.map((departure, i) => ({
    name: t(departure === 'edgeBand' ? 'look.name.edgeBand' : 'look.name.leaveOuts'),
    isGrave: true,
    value: (
      <>
        {t(`look.departure.${departure}`, {
          marked: reading.marks.edgeBandMm,
          drawn: reading.face.edgeBandMm,
        })}
        {i === departures.length - 1 && (
          <span className="block">
            {departureReason ? t('look.reason', { reason: departureReason }) : t('look.noReason')}
          </span>
        )}
      </>
    ),
  }))
}

function leftOutRow(t: Words, reading: Reading): Row {
  const out = leftOut(reading)
  const value = out && out.count > 0 ? t('look.leftOutValue', out) : t('look.leftOutNothing')
  return { name: t('look.leftOut'), value, isGrave: false }
}

const wellSupported = 0.9

function supportedRow(t: Words, { fullResult }: Reading): Row {
  const share = fullResult?.figure?.supportedShare ?? 0
  return {
    name: t('look.supported'),
    value: t('look.supportedValue', { percent: Math.floor(share * 100) }),
    isGrave: share < wellSupported,
  }
}

function residualRow(t: Words, reading: Reading): Row {
  const name = t('look.residuals')
  const summary = summariseResiduals(reading)
  if (!summary) return { name, value: t('look.residualsNone'), isGrave: true }
  const { rmsPx, farthestPx, setAside } = summary
  const value = t('look.residualsValue', { rms: rmsPx.toFixed(2), farthest: farthestPx.toFixed(1) })
  return {
    name,
    value: setAside > 0 ? `${value}; ${t('look.residualsSetAside', { count: setAside })}` : value,
    isGrave: setAside > 0,
  }
}

function pressRow(t: Words, { marks, photos }: Reading): Row {
  const name = t('look.press')
  if (!marks.pressArrow) return { name, value: t('look.pressNone'), isGrave: true }
  const count = photos.filter(({ role }) => role === 'pressed').length
  return {
    name,
    value: count > 0 ? t('look.pressPhotos', { count }) : t('look.pressArrow'),
    isGrave: false,
  }
}

function conditionsRow(t: Words, { conditions }: Reading): Row {
  const { airTemperatureC, partTemperatureC, soakMinutes } = conditions
  const name = t('look.conditions')
  if (airTemperatureC === null && partTemperatureC === null && soakMinutes === null) {
    return { name, value: t('look.conditionsNone'), isGrave: true }
  }
  const stated = (value: number | null, unit: string) =>
    value === null ? t('common:notStated') : `${value} ${unit}`
  const value = t('look.conditionsValue', {
    air: stated(airTemperatureC, '°C'),
    part: stated(partTemperatureC, '°C'),
    soak: stated(soakMinutes, 'min'),
  })
  return { name, value, isGrave: soakMinutes === null }
}

function notStatedRow(t: Words, { fullResult }: Reading): Row {
  const sources = fullResult?.figure?.notStated ?? []
  const value =
    sources.length === 0
      ? t('look.notStatedNothing')
      : sources.map((source) => t(`budget:${source}`)).join(', ')
  return { name: t('look.notStated'), value, isGrave: false }
}

function findingsRow(t: Words, { fullResult }: Reading): Row {
  const warnings = (fullResult?.findings ?? []).filter(({ severity }) => severity !== 'remark')
  return {
    name: t('look.findings'),
    value:
      warnings.length === 0
        ? t('look.findingsNone')
        : warnings.map((finding) => (
            <span key={finding.code} className="block">
              {findingWords(t, finding)}
            </span>
          )),
    isGrave: warnings.length > 0,
  }
}

function othersRow(t: Words, reading: Reading, review: Review): Row {
  const others = othersThatCount(reading, review)
  const differing = others.find(({ result }) => result?.verdict !== reading.result?.verdict)
  const name = t('look.others')
  if (differing?.result) {
    const verdict = t(`common:verdict.${differing.result.verdict}`)
    return { name, value: t('look.othersDiffer', { number: differing.number, verdict }), isGrave: true }
  }
  const value = others.length === 0 ? t('look.othersNone') : t('look.othersAgree', { count: others.length })
  return { name, value, isGrave: false }
}
