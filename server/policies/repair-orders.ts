import { everyone, no, policy, yes } from './policy'

export const readOrders = policy('repair_orders.read', everyone)
export const createOrder = policy('repair_orders.create', ['foreman', 'technician', 'advisor'])
export const updateOrder = policy('repair_orders.update', ['foreman', 'technician', 'advisor'])
export const addGroup = policy('fastener_groups.create', ['foreman', 'technician'])

/** Who signed a joint of an order does not release it, unless the shop is one person and says so. */
export const releaseOrder = policy<{ signerIds: readonly string[], releaseOwnJoint: boolean }>('repair_orders.release', ['foreman'],
  (actor, order) => order.signerIds.includes(actor.id) && !order.releaseOwnJoint
    ? no('same_person', 'You signed a joint of this order: somebody else has to release it.')
    : yes)
