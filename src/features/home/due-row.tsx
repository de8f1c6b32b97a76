import type { EquipmentDue } from '@shared/schemas/home'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { EquipmentSign } from '@/components/equipment-sign'
import { lineColumns } from '@/components/readings/reading-line'
import { classNames } from '@/lib/class-names'
import { formatDay } from '@/lib/format-when'

/** Nearer than this somebody must act. */
const soonDays = 14

export function DueRow({ due: { equipment, dueOn, daysLeft } }: { due: EquipmentDue }) {
  const { t } = useTranslation('home')
  const isPast = daysLeft < 0
  const days = t(isPast ? 'due.past' : 'due.days', { count: Math.abs(daysLeft) })
  return (
    <li
      className={classNames(
        lineColumns,
        'relative min-h-[52px] border-hairline border-t py-1.5 first:border-t-0 hover:bg-step-active',
      )}
    >
      <EquipmentSign kind={equipment.details.kind} />
      <div className="min-w-0 pr-2">
        <Link to="/equipment" className="block truncate font-semibold after:absolute after:inset-0">
          {equipment.name}
        </Link>
        <span className="block truncate text-muted text-second">
          {t(`equipment:kindOne.${equipment.details.kind}`)}
        </span>
      </div>
      <div className="min-w-0 pr-3">
        <span className={classNames('block truncate', daysLeft <= soonDays && 'text-chestnut')}>
          {t(isPast ? 'due.ended' : 'due.ends', { day: formatDay(dueOn) })}
        </span>
        <span className="block truncate text-muted text-second">{equipment.description}</span>
      </div>
      <span className="whitespace-nowrap text-right text-muted text-second max-desk:col-span-2 max-desk:text-left">
        {days}
      </span>
    </li>
  )
}
