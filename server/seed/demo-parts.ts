import type { DecisionRule, NewFace, Tolerance } from '@shared/schemas/parts'

export interface DemoPart {
  customer: string
  number: string
  revision: string
  name: string
  material: string
  face: NewFace
  lot: string
  serials: string[]
}

export const demoCustomers = [
  { name: 'Dunmarrow Pumps', address: 'Weir Lane 4, Dunmarrow', email: 'quality@dunmarrow.example' },
  { name: 'Ostrey Valves', address: 'Quay Road 17, Ostrey', email: 'goods-in@ostrey.example' },
]

const upTo = (valueUm: number, typed: string): Tolerance => ({ kind: 'plain', max: { valueUm, typed } })
const simple: DecisionRule = { kind: 'simpleAcceptance', guardFactor: 0 }
const guarded: DecisionRule = { kind: 'iso14253_2017', guardFactor: 0.825 }

const face = (own: Pick<NewFace, 'name' | 'size' | 'tolerance'> & Partial<NewFace>): NewFace => ({
  reference: 'minimumZone',
  rule: simple,
  edgeBandMm: 1,
  support: 'free',
  template: null,
  ...own,
})

/** Five kinds of faces that a lapping shop sees. */
export const demoParts: DemoPart[] = [
  {
    customer: 'Dunmarrow Pumps',
    number: 'SR-40',
    revision: 'C',
    name: 'Pump seal ring',
    material: 'Silicon carbide',
    face: face({
      name: 'Sealing face',
      size: { shape: 'annulus', diameterMm: 40, boreMm: 28 },
      tolerance: upTo(0.6, '0.6 um'),
      edgeBandMm: 0.5,
    }),
    lot: 'L-2611',
    serials: ['SR-40-101', 'SR-40-102', 'SR-40-103', 'SR-40-104', 'SR-40-105'],
  },
  {
    customer: 'Ostrey Valves',
    number: 'VP-43',
    revision: 'A',
    name: 'Valve plate',
    material: 'Hardened steel',
    face: face({
      name: 'Port face',
      size: { shape: 'annulus', diameterMm: 43, boreMm: 12 },
      tolerance: {
        kind: 'signed',
        least: { valueUm: -0.6, typed: '-0.6 um' },
        most: { valueUm: -0.2, typed: '-0.2 um' },
      },
      rule: guarded,
    }),
    lot: 'L-2608',
    serials: ['VP-43-007', 'VP-43-008', 'VP-43-009', 'VP-43-010'],
  },
  {
    customer: 'Dunmarrow Pumps',
    number: 'GB-35',
    revision: '',
    name: 'Gauge-type block',
    material: 'Tungsten carbide',
    face: face({
      name: 'Measuring face',
      size: { shape: 'block', widthMm: 35, heightMm: 9 },
      tolerance: upTo(0.15, '6 uin'),
      rule: guarded,
      edgeBandMm: 0.5,
    }),
    lot: 'L-2602',
    serials: ['GB-35-1', 'GB-35-2', 'GB-35-3'],
  },
  {
    customer: 'Ostrey Valves',
    number: 'LD-60',
    revision: 'B',
    name: 'Lapped disc',
    material: 'Bronze',
    face: face({
      name: 'Top',
      size: { shape: 'disc', diameterMm: 60 },
      tolerance: upTo(0.5893, '2 bands'),
    }),
    lot: 'L-2615',
    serials: ['LD-60-21', 'LD-60-22', 'LD-60-23'],
  },
  {
    customer: 'Dunmarrow Pumps',
    number: 'VC-60',
    revision: 'B',
    name: 'Vacuum chuck',
    material: 'Alumina',
    face: face({
      name: 'Chucking face',
      size: { shape: 'disc', diameterMm: 60 },
      tolerance: upTo(1, '1 um'),
      support: 'held',
    }),
    lot: 'L-2613',
    serials: ['VC-60-0312', 'VC-60-0313', 'VC-60-0314'],
  },
]
