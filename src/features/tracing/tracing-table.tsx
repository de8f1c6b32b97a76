import { engineSetUp } from '@shared/metrology'
import type { Equipment } from '@shared/schemas/equipment'
import type { Reading } from '@shared/schemas/readings'
import { useEffect, useMemo, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { Desk } from './desk'
import { openTable } from './open-table'
import type { Circumstances } from './result/read-marks'
import { setUpWords } from './set-up-words'
import { TableProvider } from './table-store'

interface Props {
  reading: Reading
  equipment: readonly Equipment[]
}

/** What is marked is in the table's store, and each part of the page listens for what it shows. */
export function TracingTable({ reading, equipment }: Props) {
  const { t } = useTranslation('table')
  const circumstances = useMemo(() => circumstancesOf(reading, equipment), [reading, equipment])
  const [opened] = useState(() => openTable(reading, circumstances?.setUp.viewingAngleDeg ?? 0))
  useEffect(() => {
    if (opened.isRestored) toast(t('restored'), { id: 'restored' })
  }, [opened, t])
  return (
    <TableProvider value={opened.store}>
      <Desk
        reading={reading}
        circumstances={circumstances}
        setUpWords={setUpWords(t, reading, equipment)}
        overtaken={opened.overtaken}
      />
    </TableProvider>
  )
}

function circumstancesOf(reading: Reading, equipment: readonly Equipment[]): Circumstances {
  const setUp = engineSetUp(reading, (id) => equipment.find((item) => item.id === id)?.details ?? null)
  if (!setUp) return null
  const photo = reading.photos.find(({ role }) => role === 'bands') ?? null
  return { size: reading.face.size, photo, setUp, mirrored: reading.setUp.mirrored }
}
