/** Closed list of what the trail records. A kind is never renamed: old rows carry it for good. */
export const eventKinds = [
  'demo.seeded',
  'person.added',
  'person.changed',
  'person.passwordChanged',
  'session.started',
  'settings.changed',
  'customer.added',
  'customer.changed',
  'part.added',
  'part.changed',
  'face.added',
  'face.changed',
  'lot.added',
  'piece.added',
  'equipment.added',
  'equipment.changed',
  'reading.started',
  'reading.changed',
  'reading.photoAdded',
  'reading.photoRemoved',
  'reading.computed',
  'reading.sentForReview',
  'reading.reopened',
  'reading.sentBack',
  'reading.agreed',
  'reading.setAside',
  'reading.certified',
] as const
export type EventKind = (typeof eventKinds)[number]

export const eventSubjects = [
  'shop',
  'person',
  'customer',
  'part',
  'face',
  'lot',
  'piece',
  'equipment',
  'reading',
] as const
export type EventSubject = (typeof eventSubjects)[number]
