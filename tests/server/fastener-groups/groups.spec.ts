import { buildGarage, buildJoint, buildOrder, buildSpec, sign } from '../../factories/joint'
import { PIN } from '../../factories/shop'
import type { Shop } from '../../../server/context'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()
const everyone = ['technician', 'foreman', 'quality_lead', 'advisor', 'administrator'] as const
const out = { readings: [1, 2, 3, 4].map(position => ({ position, stage: 1, value: 46, unit: 'N.m' })), deviationReason: 'Bulletin in hand' }

const open = async (shop: Shop) => ({ id: (await buildJoint(await buildGarage(api, {}, shop))).groupId })
const signed = async (shop: Shop, overrides: object = {}) => {
  const garage = await buildGarage(api, {}, shop)
  const joint = await buildJoint(garage)
  return { id: joint.groupId, signOff: await sign(garage, joint, overrides) }
}
const reasons = { reason: [undefined, '', 'x', 'r'.repeat(2001), 7] }
const pins = { pin: [undefined, '12345', 408152] }

ladder({ api, method: 'GET', path: '/fastener-groups/:id', roles: everyone, scene: open })
ladder({
  api, method: 'POST', path: '/repair-orders/:id/fastener-groups', roles: ['foreman', 'technician'],
  scene: async (shop) => {
    const garage = await buildGarage(api, {}, shop)
    return { id: await buildOrder(garage), revisionId: (await buildSpec(garage)).revisionId }
  },
  valid: ({ revisionId }) => ({ specRevisionId: revisionId }),
  spoil: { specRevisionId: ['x', 7, null], boltCount: [0, -1, 1.5, 121, 'x'], name: ['', 7] },
  log: 'fastener_groups.create',
})
ladder({
  api, method: 'POST', path: '/fastener-groups/:id/disturbed', roles: ['technician', 'foreman'], scene: shop => signed(shop),
  valid: () => ({ reason: 'Gasket pinched' }), spoil: reasons, status: 200, log: 'fastener_groups.disturb',
})
ladder({
  api, method: 'POST', path: '/fastener-groups/:id/concession', roles: ['foreman'], scene: shop => signed(shop, out),
  valid: () => ({ reason: 'Checked against the bulletin', pin: PIN }), spoil: { ...reasons, ...pins }, status: 200, log: 'fastener_groups.concede',
})
ladder({
  api, method: 'POST', path: '/fastener-groups/:id/not-disturbed', roles: ['foreman'], scene: open,
  valid: () => ({ reason: 'Only listed, never opened', pin: PIN }), spoil: { ...reasons, ...pins }, status: 200, log: 'fastener_groups.mark_not_disturbed',
})
ladder({ api, method: 'GET', path: '/sign-offs/:id', roles: everyone, scene: async shop => ({ id: (await signed(shop)).signOff.id }) })
ladder({
  api, method: 'POST', path: '/sign-offs/:id/void', roles: ['foreman'], scene: async shop => ({ id: (await signed(shop)).signOff.id }),
  valid: () => ({ reason: 'The wrong vehicle', pin: PIN }), spoil: { ...reasons, ...pins }, status: 200, log: 'sign_offs.void',
})
ladder({
  api, method: 'GET', path: '/sign-offs', roles: everyone,
  spoilQuery: { sort: ['hash', '-'], limit: ['0', '201', '1.5'], verdict: ['good'], from: ['yesterday'], to: ['2026-02-30'], wrenchId: ['x'], technicianId: ['x'], cursor: ['x', 'W10'] },
})
