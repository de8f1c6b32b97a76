import type { Role } from '@shared/access/permissions'

export interface DemoSignIn {
  name: string
  email: string
  password: string
  roles: Role[]
}

/** The people of the demo shop, with passwords that are no secret: the start prints them. */
export const demoSignIns: DemoSignIn[] = [
  {
    name: 'Maren Oldacre',
    email: 'maren@quillmere.example',
    password: 'straw bands at noon',
    roles: ['inspector'],
  },
  {
    name: 'Edda Thorne',
    email: 'edda@quillmere.example',
    password: 'clean dry and soaked',
    roles: ['inspector'],
  },
  {
    name: 'Tobias Fenwright',
    email: 'tobias@quillmere.example',
    password: 'second pair of eyes',
    roles: ['reviewer'],
  },
  {
    name: 'Ines Calloway',
    email: 'ines@quillmere.example',
    password: 'signed and sealed',
    roles: ['qa'],
  },
  {
    name: 'Rowan Ashdown',
    email: 'rowan@quillmere.example',
    password: 'keys to the shop',
    roles: ['admin'],
  },
]
