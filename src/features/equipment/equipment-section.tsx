import type { Equipment, EquipmentKind } from '@shared/schemas/equipment'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { EquipmentSign } from '@/components/equipment-sign'
import { Facts } from '@/components/facts'
import { Section } from '@/components/section'
import { classNames } from '@/lib/class-names'
import { formatDay } from '@/lib/format-when'
import { useMay } from '@/lib/session'
import { EquipmentDialog } from './equipment-dialog'
import { equipmentFacts } from './equipment-facts'

interface Props {
  kind: EquipmentKind
  rows: readonly Equipment[]
}

export function EquipmentSection({ kind, rows }: Props) {
  const { t } = useTranslation('equipment')
  const mayEdit = useMay('equipment:edit')
  const [shown, setShown] = useState<Equipment | 'new' | null>(null)
  return (
    <Section title={t(`kind.${kind}`)} note={t(`kindNote.${kind}`)}>
      {rows.length === 0 && <EmptyState>{t(`empty.${kind}`)}</EmptyState>}
      <ul>
        {rows.map((equipment) => (
          <EquipmentRow
            key={equipment.id}
            equipment={equipment}
            onEdit={mayEdit ? () => setShown(equipment) : undefined}
          />
        ))}
      </ul>
      {mayEdit && (
        <Button className="mt-2" onClick={() => setShown('new')}>
          {t(`addKind.${kind}`)}
        </Button>
      )}
      {shown && (
        <EquipmentDialog
          kind={kind}
          equipment={shown === 'new' ? undefined : shown}
          onClose={() => setShown(null)}
        />
      )}
    </Section>
  )
}

function EquipmentRow({ equipment, onEdit }: { equipment: Equipment; onEdit?: () => void }) {
  const { t } = useTranslation('equipment')
  const { name, description, inService, details } = equipment
  return (
    <li className="flex flex-wrap items-start gap-x-4 gap-y-2 border-hairline border-t py-2.5 first:border-t-0">
      <EquipmentSign kind={details.kind} />
      <div className="w-56 min-w-0">
        <h3 className={classNames('font-semibold', !inService && 'text-muted')}>{name}</h3>
        <p className="text-muted text-second">
          {inService ? description : [t('outOfService'), description].filter(Boolean).join('; ')}
        </p>
      </div>
      <div className="min-w-0 flex-1">
        <Facts
          facts={[
            ...equipmentFacts(equipment, t),
            { name: t('facts.calibration'), value: <Calibration equipment={equipment} /> },
          ]}
        />
      </div>
      {onEdit && (
        <Button kind="quiet" onClick={onEdit} aria-label={t('edit', { name })}>
          {t('common:edit')}
        </Button>
      )}
    </li>
  )
}

function Calibration({ equipment: { calibration } }: { equipment: Equipment }) {
  const { t } = useTranslation('equipment')
  if (!calibration?.dueOn) return t('facts.noCalibration')
  const isPast = calibration.dueOn < new Date().toISOString().slice(0, 10)
  return (
    <span className={isPast ? 'text-chestnut' : undefined}>
      {t('facts.calibrationUntil', {
        day: formatDay(calibration.dueOn),
        laboratory: calibration.laboratory,
        number: calibration.certificateNumber,
      })}
    </span>
  )
}
