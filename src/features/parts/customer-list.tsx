import type { Customer } from '@shared/schemas/parts'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { Section } from '@/components/section'
import { useCustomers } from '@/lib/queries/parts'
import { useMay } from '@/lib/session'
import { CustomerDialog } from './customer-dialog'

export function CustomerList() {
  const { t } = useTranslation('parts')
  const customers = useCustomers()
  const mayEdit = useMay('part:edit')
  const [shown, setShown] = useState<Customer | 'new' | null>(null)
  const rows = customers.data?.rows ?? []
  return (
    <Section title={t('customers.title')} note={t('customers.note')}>
      {customers.isSuccess && rows.length === 0 && <EmptyState>{t('customers.empty')}</EmptyState>}
      <ul>
        {rows.map((customer) => (
          <li
            key={customer.id}
            className="flex flex-wrap items-center gap-x-6 border-hairline border-t py-2 first:border-t-0"
          >
            <span className="w-56 font-semibold">{customer.name}</span>
            <span className="min-w-0 flex-1 text-muted text-second">
              {[customer.address, customer.email].filter(Boolean).join(' · ')}
            </span>
            {mayEdit && (
              <Button
                kind="quiet"
                onClick={() => setShown(customer)}
                aria-label={t('customers.edit', { name: customer.name })}
              >
                {t('common:edit')}
              </Button>
            )}
          </li>
        ))}
      </ul>
      {mayEdit && (
        <Button className="mt-2" onClick={() => setShown('new')}>
          {t('customers.add')}
        </Button>
      )}
      {shown && (
        <CustomerDialog customer={shown === 'new' ? undefined : shown} onClose={() => setShown(null)} />
      )}
    </Section>
  )
}
