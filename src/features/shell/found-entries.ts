import type { Found } from '@shared/schemas/search'
import type { TFunction } from 'i18next'

export interface FoundEntry {
  key: string
  group: 'pieces' | 'parts' | 'readings' | 'certificates' | 'customers'
  to: string
  main: string
  note: string
}

/** What was found as one list in the order of the screen. */
export function foundEntries(found: Found, t: TFunction): FoundEntry[] {
  return [
    ...found.pieces.map((piece) => ({
      key: piece.id,
      group: 'pieces' as const,
      to: `/pieces/${piece.id}`,
      main: `${piece.partNumber} · ${piece.serial}`,
      note: piece.partName,
    })),
    ...found.parts.map((part) => ({
      key: part.id,
      group: 'parts' as const,
      to: `/parts/${part.id}`,
      main: part.number,
      note: `${part.name}, ${part.customerName}`,
    })),
    ...found.readings.map((reading) => ({
      key: reading.id,
      group: 'readings' as const,
      to: `/readings/${reading.id}`,
      main: t('nav:search.reading', { number: reading.number }),
      note: `${reading.partNumber} · ${reading.serial}, ${t(`common:state.${reading.state}`)}`,
    })),
    ...found.certificates.map((certificate) => ({
      key: certificate.id,
      group: 'certificates' as const,
      to: `/certificates/${certificate.id}`,
      main: certificate.number,
      note: `${certificate.partNumber} · ${certificate.serial}, ${t(`certificate:state.${certificate.state}`)}`,
    })),
    ...found.customers.map((customer) => ({
      key: customer.id,
      group: 'customers' as const,
      to: `/parts?search=${encodeURIComponent(customer.name)}`,
      main: customer.name,
      note: '',
    })),
  ]
}
