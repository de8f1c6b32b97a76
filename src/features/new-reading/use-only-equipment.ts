import type { Equipment } from '@shared/schemas/equipment'
import type { NewReading } from '@shared/schemas/readings'
import { useEffect } from 'react'
import type { UseFormReturn } from 'react-hook-form'
import { fieldOfKind, inServiceOf, type NewReadingForm } from './new-reading-form'

const kinds = ['lightSource', 'referenceFlat', 'cameraSetUp', 'thermometer'] as const

/** Where the shop has one of a kind in service, that one is meant unless somebody says otherwise. */
export function useOnlyEquipment(
  form: UseFormReturn<NewReadingForm, unknown, NewReading>,
  rows: readonly Equipment[] | undefined,
): void {
  useEffect(() => {
    if (!rows) return
    for (const kind of kinds) {
      const field = fieldOfKind[kind]
      const [only, ...others] = inServiceOf(rows, kind)
      if (!only || others.length > 0 || form.getFieldState(field).isDirty) continue
      form.setValue(field, only.id)
      if (only.details.kind === 'cameraSetUp') form.setValue('mirrored', only.details.mirrored)
    }
  }, [form, rows])
}
