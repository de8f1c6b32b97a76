import type { Face } from '@shared/schemas/parts'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { Facts } from '@/components/facts'
import { useFaceWords } from '@/components/readings/face-words'
import { ToleranceRule } from '@/components/tolerance-rule/tolerance-rule'
import { useMay } from '@/lib/session'
import { useDisplayUnit } from '@/lib/settings'
import { FaceDialog } from './face-dialog'

/** A face with its sizes, tolerance, rule, and the empty tolerance rule. */
export function FaceRow({ face }: { face: Face }) {
  const { t } = useTranslation('parts')
  const words = useFaceWords()
  const unit = useDisplayUnit()
  const mayEdit = useMay('part:edit')
  const [isEditing, setEditing] = useState(false)
  return (
    <li className="flex flex-wrap items-start gap-x-10 gap-y-3 border-hairline border-t py-3 first:border-t-0">
      <div className="w-[11rem]">
        <h3 className="font-semibold text-figure">{face.name}</h3>
        <p className="text-muted text-second">{words.size(face)}</p>
      </div>
      <div className="min-w-0 flex-1">
        <Facts
          facts={[
            { name: t('face.facts.tolerance'), value: words.typedTolerance(face.tolerance) },
            { name: t('face.facts.reference'), value: words.reference(face.reference) },
            { name: t('face.facts.rule'), value: words.rule(face.rule) },
            { name: t('face.facts.support'), value: t(`face.supports.${face.support}`) },
          ]}
        />
      </div>
      {face.tolerance.kind !== 'none' && (
        <ToleranceRule
          size="list"
          unit={unit}
          tolerance={face.tolerance}
          guardFactor={face.rule.guardFactor}
          resultUm={null}
          expandedUncertaintyUm={null}
          verdict="noVerdict"
          draft={false}
        />
      )}
      {mayEdit && (
        <Button
          kind="quiet"
          onClick={() => setEditing(true)}
          aria-label={t('face.edit', { name: face.name })}
        >
          {t('common:edit')}
        </Button>
      )}
      {isEditing && <FaceDialog partId={face.partId} face={face} onClose={() => setEditing(false)} />}
    </li>
  )
}
