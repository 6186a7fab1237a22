import { createGroupBody, type CreateGroupBody } from '#shared/schemas/repair-orders'
import type { QuantityEntry } from '~/components/torque/QuantityInput.vue'
import { countOf } from './bolt-numbers'
import { FieldReader, readForm } from './form-issues'

const [, shopValueBody] = createGroupBody.def.options

/** A shop value as typed. */
export interface ShopValueEntry {
  component: string
  bolts: string
  jointClass: 'general' | 'sealing'
  target: QuantityEntry
  thread: string
  propertyClass: string
  threadCondition: string
  reasoning: string
}

export const emptyShopValue = (): ShopValueEntry => ({
  component: '', bolts: '', jointClass: 'general', target: { text: '', value: null, unit: 'N.m' }, thread: '', propertyClass: '', threadCondition: '', reasoning: '',
})

/** @throws ApiError 400 `invalid` with every issue */
export function readShopValue(entry: ShopValueEntry): CreateGroupBody {
  const read = new FieldReader()
  const value = {
    noPublishedSpec: true,
    component: entry.component,
    boltCount: countOf(entry.bolts) ?? undefined,
    jointClass: entry.jointClass,
    target: read.quantity('target', entry.target),
    thread: read.text(entry.thread),
    propertyClass: read.text(entry.propertyClass),
    threadCondition: read.text(entry.threadCondition),
    reasoning: entry.reasoning,
  }
  if (!countOf(entry.bolts)) read.issues.push({ path: 'boltCount', message: 'Count the bolts: a whole number up to 120.' })
  return readForm(shopValueBody, { value, issues: read.issues })
}
