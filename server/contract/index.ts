import * as people from './people'
import type { RouteContract } from './route'

/** Every route of the API. A test holds this list against the files of server/api. */
export const contracts: readonly RouteContract[] = [
  ...Object.values(people),
]
