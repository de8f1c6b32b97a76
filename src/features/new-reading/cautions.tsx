import { useTranslation } from 'react-i18next'
import { Section } from '@/components/section'

const cautions = ['lamps', 'warm', 'lift', 'stick', 'rules'] as const

export function Cautions() {
  const { t } = useTranslation('readings')
  return (
    <Section title={t('new.cautions.title')}>
      <ul className="max-w-[70ch] pt-3">
        {cautions.map((caution) => (
          <li key={caution} className="border-hairline border-t py-1.5 first:border-t-0">
            {t(`new.cautions.${caution}`)}
          </li>
        ))}
      </ul>
    </Section>
  )
}
