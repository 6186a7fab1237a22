import type { CreateUserBody, ShopRules, UpdateUserBody, UserAnswer } from '#shared/schemas/auth'

/** The people of the shop, by name unless the address says otherwise. */
export function usePeople() {
  const state = useQueryState(['sort'] as const)
  const { value } = state
  const list = useRead<{ items: UserAnswer[], nextCursor: string | null }>('people', '/users', () => ({
    sort: value('sort') || 'name', cursor: value('cursor'), limit: 100,
  }))
  return { ...state, list }
}

/** What an administrator does about people and the shop's rules. Each throws ApiError when the server refuses. */
export function usePeopleActions() {
  const $api = useApi()
  const { add } = useToasts()
  const { load } = useSession()

  /** Answers the temporary passphrase, which is told once. @throws ApiError 409 `id_taken` */
  async function create(body: CreateUserBody) {
    const person = await $api<UserAnswer & { temporaryPassphrase: string }>('/users', { method: 'POST', body })
    await refreshNuxtData('people')
    return person
  }

  /** Answers a temporary passphrase where one was asked for. @throws ApiError 403 `same_person` */
  async function change(person: UserAnswer, body: UpdateUserBody, done: string) {
    const changed = await $api<UserAnswer & { temporaryPassphrase?: string }>(`/users/${person.id}`, { method: 'PATCH', body })
    await refreshNuxtData('people')
    add(`${person.name}: ${done}.`)
    return changed
  }

  async function changeRules(rules: Partial<ShopRules>) {
    await $api('/shop', { method: 'PATCH', body: rules })
    await load()
    add('The shop\'s rules are changed.')
  }

  return { create, change, changeRules }
}

/** One's own passphrase and PIN. Each throws ApiError when the server refuses. */
export function useOwnSecrets() {
  const $api = useApi()
  const { add } = useToasts()
  const { load } = useSession()

  /** Ends all one's other sessions. @throws ApiError 422 when the current one is wrong or the next is weak */
  async function changePassphrase(body: { current: string, next: string }) {
    await $api('/auth/passphrase', { method: 'POST', body })
    await load()
    add('Your passphrase is changed. Other devices are signed out.')
  }

  /** @throws ApiError 422 when the passphrase is wrong or the PIN is easily guessed */
  async function changePin(body: { password: string, pin: string }) {
    await $api('/auth/pin', { method: 'POST', body })
    await load()
    add('Your PIN is set. You sign with it from now on.')
  }

  return { changePassphrase, changePin }
}
