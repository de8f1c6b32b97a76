import type { CertificateRow } from '@shared/schemas/certificates'
import type { Reading } from '@shared/schemas/readings'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { useMay } from '@/lib/session'
import { IssueDialog } from './issue-dialog'

interface Props {
  reading: Reading
  /** Certificates of the piece, newest first. */
  certificates: readonly CertificateRow[]
}

/** For QA, on an agreed reading, or on a certified one whose certificate stands no more. */
export function IssueButton({ reading, certificates }: Props) {
  const { t } = useTranslation('certificate')
  const mayIssue = useMay('certificate:issue')
  const [isOpen, setOpen] = useState(false)
  const standing =
    certificates.find(({ faceId, state }) => faceId === reading.face.id && state === 'issued') ?? null
  const isSettled = reading.state === 'agreed' || reading.state === 'certified'
  if (!mayIssue || !isSettled) return null
  return (
    <>
      <Button kind={standing?.readingId === reading.id ? 'plain' : 'main'} onClick={() => setOpen(true)}>
        {standing ? t('issue.openReplacing') : t('issue.open')}
      </Button>
      {isOpen && <IssueDialog reading={reading} replaced={standing} onClose={() => setOpen(false)} />}
    </>
  )
}
