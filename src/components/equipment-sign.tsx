import type { EquipmentKind } from '@shared/schemas/equipment'
import type { ReactElement } from 'react'

const drawings: Record<EquipmentKind, ReactElement> = {
  referenceFlat: (
    <>
      <path d="M5 13h24v7H5z" />
      <path d="M8 23.500h18" />
    </>
  ),
  lightSource: (
    <>
      <circle cx="17" cy="17" r="4.500" />
      <path d="M17 6v4M17 24v4M6 17h4M24 17h4" />
    </>
  ),
  cameraSetUp: (
    <>
      <path d="M6 12h14v11H6zM20 16l7-3.500v10L20 19.500" />
    </>
  ),
  thermometer: (
    <>
      <path d="M15 7v13.500M19 7v13.500" />
      <circle cx="17" cy="23.500" r="3.500" />
      <path d="M22 9h4M22 13h3M22 17h4" />
    </>
  ),
}

/** A small drawing of the kind of equipment. Ornament: its name stands beside it. */
export function EquipmentSign({ kind }: { kind: EquipmentKind }) {
  return (
    <svg aria-hidden="true" width="34" height="34" fill="none" stroke="var(--edge)" strokeWidth="1.2">
      {drawings[kind]}
    </svg>
  )
}
