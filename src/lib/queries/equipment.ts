import { equipmentSchema, type NewEquipment } from '@shared/schemas/equipment'
import { useQuery } from '@tanstack/react-query'
import { z } from 'zod'
import { api } from '../api-client'
import { queryClient } from '../query-client'
import { queryKeys } from '../query-keys'

/** All kinds at once: a shop has few enough. */
export function useEquipment() {
  return useQuery({
    queryKey: queryKeys.equipment,
    queryFn: () => api('GET', '/equipment', z.object({ rows: z.array(equipmentSchema) })),
  })
}

export async function saveEquipment(equipment: NewEquipment, id?: string) {
  const path = id ? `/equipment/${id}` : '/equipment'
  const saved = await api(id ? 'PATCH' : 'POST', path, equipmentSchema, { body: equipment })
  await Promise.all([
    queryClient.invalidateQueries({ queryKey: queryKeys.equipment }),
    queryClient.invalidateQueries({ queryKey: queryKeys.home }),
  ])
  return saved
}
