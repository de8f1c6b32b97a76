import type { PiecePage } from '@shared/schemas/pieces'
import type { ReadingRow } from '@shared/schemas/readings'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { Section } from '@/components/section'
import { formatMoment } from '@/lib/format-when'
import { useMay } from '@/lib/session'
import { DispositionDialog } from './disposition-dialog'

/** What is done with a piece that doesn't conform; nothing stands here for one that does. */
export function DispositionSection({ page }: { page: PiecePage }) {
  const { t } = useTranslation('review')
  const mayDispose = useMay('piece:dispose')
  const [isOpen, setOpen] = useState(false)
  const { piece, dispositions, readings } = page
  const reading = needsDecision(readings)
  if (!reading && dispositions.length === 0) return null
  return (
    <Section title={t('disposition.title')} note={t('disposition.note')}>
      {dispositions.length === 0 && <p className="py-2 text-chestnut">{t('disposition.none')}</p>}
      <ul>
        {dispositions.map((row) => (
          <li
            key={row.id}
            className="grid grid-cols-[8rem_minmax(0,1fr)] gap-x-4 border-hairline border-t py-2 first:border-t-0"
          >
            <span className="font-semibold text-chestnut">{t(`disposition.kinds.${row.kind}`)}</span>
            <div>
              <p>{row.reason}</p>
              {row.onWordOf && <p>{t('disposition.word', { name: row.onWordOf })}</p>}
              <p className="text-muted text-second">
                {t('disposition.of', {
                  number: row.readingNumber,
                  name: row.decidedBy.name,
                  when: formatMoment(row.decidedAt),
                })}
              </p>
            </div>
          </li>
        ))}
      </ul>
      {mayDispose && reading && (
        <Button className="mt-3" onClick={() => setOpen(true)}>
          {t('disposition.decide')}
        </Button>
      )}
      {isOpen && reading && (
        <DispositionDialog pieceId={piece.id} reading={reading} onClose={() => setOpen(false)} />
      )}
    </Section>
  )
}

/** The newest settled reading, if it doesn't show that the piece conforms. */
function needsDecision(readings: readonly ReadingRow[]): ReadingRow | null {
  const settled = readings.findLast(({ state }) => state === 'agreed' || state === 'certified')
  const verdict = settled?.result?.verdict
  return settled && (verdict === 'doesNotConform' || verdict === 'neitherProven') ? settled : null
}
