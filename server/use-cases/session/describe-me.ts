import type { Me } from '@shared/schemas/people'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { requirePerson } from '../../db/people'
import { readSettings } from '../../db/settings'

/** Who is signed in, and whether every page must warn of a network that others can read. */
export function describeMe({ db, env }: AppContext, actor: Pick<Actor, 'id'>, plainConnection: boolean): Me {
  const { shopName, allowPlainNetwork } = readSettings(db)
  return {
    ...requirePerson(db, actor.id),
    shop: { name: shopName },
    plainNetwork: plainConnection || (allowPlainNetwork && env.tls === 'off'),
  }
}
