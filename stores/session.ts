import type { Me } from '#shared/schemas/auth'

/** Who is signed in, as far as screens need to know; the server decides what they may. */
export const useSessionStore = defineStore('session', () => {
  const user = ref<Me['user'] | null>(null)
  /** Dates and times are shown in its `timeZone`, an IANA name; `rules` are the shop's own. */
  const shop = ref<Me['shop'] | null>(null)
  /** What the role may ever do, for buttons that stand outside a record. */
  const can = ref<Me['can']>({})
  const timeZone = computed(() => shop.value?.timeZone ?? 'UTC')

  function setMe(me: Me) {
    user.value = me.user
    shop.value = me.shop
    can.value = me.can
  }

  function clear() {
    user.value = null
    shop.value = null
    can.value = {}
  }

  return { user, shop, can, timeZone, setMe, clear }
})
