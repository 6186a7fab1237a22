import { mockNuxtImport, mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { createError, readBody, setResponseStatus } from 'h3'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { Me } from '#shared/schemas/auth'
import { SessionPassphrase, SessionPin } from '#components'
import { ApiError, useAct, useApi, useSessionStore } from '#imports'
import SignIn from '~/pages/sign-in.vue'

const { navigateTo } = vi.hoisted(() => ({ navigateTo: vi.fn() }))
mockNuxtImport('navigateTo', () => navigateTo)

const me: Me = {
  user: {
    id: '018f0000-0000-7000-8000-000000000001', name: 'Dana Fiorelli', role: 'foreman', email: 'dana@shop.example',
    shopId: '018f0000-0000-7000-8000-000000000009', hasPin: true, mustChangePassphrase: false,
  },
  shop: {
    id: '018f0000-0000-7000-8000-000000000009', name: 'Harbour Fleet', timeZone: 'Europe/Berlin',
    rules: { defaultTolerancePercent: 10, dueSoonDays: 30, unfitWrench: 'refuse', approveOwnDraft: true, releaseOwnJoint: false },
  },
  can: { createOrder: true },
}

function refusal(status: number, code: string, message: string, more: object = {}) {
  return { statusCode: status, statusMessage: 'No', message, data: { code, ...more } }
}

registerEndpoint('/api/auth/me', () => me)
registerEndpoint('/api/auth/sign-in', {
  method: 'POST',
  handler: async (event) => {
    const { password } = await readBody<{ password: string }>(event)
    if (password === 'right') return { user: me.user }
    const tooMany = password === 'often'
    setResponseStatus(event, tooMany ? 429 : 401)
    return tooMany
      ? refusal(429, 'too_many', 'Too many tries from here.', { retryAfterSeconds: 130 })
      : refusal(401, 'bad_credentials', 'E-mail or passphrase is not right.')
  },
})
const signedOut = refusal(401, 'signed_out', 'Sign in first.')
registerEndpoint('/api/read-signed-out', (event) => {
  setResponseStatus(event, 401)
  return signedOut
})
registerEndpoint('/api/write-signed-out', {
  method: 'POST',
  handler: (event) => {
    setResponseStatus(event, 401)
    return signedOut
  },
})

beforeEach(() => {
  navigateTo.mockClear()
  useSessionStore().clear()
})

async function signInWith(password: string) {
  const page = await mountSuspended(SignIn, { route: '/sign-in?to=/sign-offs?verdict=low' })
  await page.get('input[type=email]').setValue('dana@shop.example')
  await page.get('input[type=password]').setValue(password)
  await page.get('form').trigger('submit')
  await vi.waitFor(() => expect(page.find('[aria-busy]').exists()).toBe(false))
  return page
}

describe('sign-in', () => {
  it('fills the session and goes where one was', async () => {
    await signInWith('right')
    expect(useSessionStore().user?.name).toBe('Dana Fiorelli')
    expect(useSessionStore().can).toEqual({ createOrder: true })
    expect(useSessionStore().timeZone).toBe('Europe/Berlin')
    expect(navigateTo).toHaveBeenCalledWith('/sign-offs?verdict=low', { replace: true })
  })

  it('says in the server\'s words what is wrong, and keeps what was typed', async () => {
    const page = await signInWith('wrong')
    expect(page.get('[role=alert]').text()).toBe('E-mail or passphrase is not right.')
    expect(page.get<HTMLInputElement>('input[type=email]').element.value).toBe('dana@shop.example')
    expect(navigateTo).not.toHaveBeenCalled()
  })

  it('says for how many minutes it is closed', async () => {
    expect((await signInWith('often')).get('[role=alert]').text()).toContain('opens again in 3 minutes')
  })

  it('marks empty fields without asking the server', async () => {
    const page = await mountSuspended(SignIn, { route: '/sign-in' })
    await page.get('form').trigger('submit')
    await flushPromises()
    expect(page.findAll('[aria-invalid=true]')).toHaveLength(2)
  })
})

describe('useApi', () => {
  it('leads to sign-in when a read finds the session ended', async () => {
    useSessionStore().setMe(me)
    await expect(useApi()('/read-signed-out')).rejects.toMatchObject({ status: 401, code: 'signed_out' })
    expect(useSessionStore().user).toBeNull()
    expect(String(navigateTo.mock.calls[0]?.[0])).toMatch(/^\/sign-in/)
  })

  it('only refuses a write, so that nothing typed is lost', async () => {
    useSessionStore().setMe(me)
    await expect(useApi()('/write-signed-out', { method: 'POST', body: {} })).rejects.toThrow('sign in again in another tab')
    expect(navigateTo).not.toHaveBeenCalled()
  })
})

describe('useAct', () => {
  it('runs once at a time and answers what came of it', async () => {
    const act = vi.fn(async (n: number) => n * 2)
    const { busy, run } = useAct(act)
    const [first, second] = [run(2), run(3)]
    expect(busy.value).toBe(true)
    expect(await Promise.all([first, second])).toEqual([4, undefined])
    expect(act).toHaveBeenCalledTimes(1)
    expect(busy.value).toBe(false)
  })

  it('tells issues of fields at the field, others beside the button', async () => {
    const issues = [{ path: 'name', message: 'Needed.' }, { path: 'shop', message: 'Closed.' }]
    const { notice, errorOf, run } = useAct(async () => {
      throw new ApiError(400, 'Needed.', { code: 'invalid', issues })
    }, ['name'])
    await run()
    expect(errorOf('name')).toBe('Needed.')
    expect(notice.value).toBe('Closed.')
  })

  it('takes a failure nobody foresaw as the server\'s silence', async () => {
    const { refusal: told, run } = useAct(async () => {
      throw createError('gone')
    })
    await run()
    expect(told.value).toBeInstanceOf(ApiError)
  })
})

describe('own secrets', () => {
  it('refuse a short passphrase at its field and empty the fields only after success', async () => {
    const change = vi.fn(async () => undefined)
    const form = await mountSuspended(SessionPassphrase, { props: { change } })
    const [current, next] = form.findAll('input')
    await current?.setValue('the one before')
    await next?.setValue('short')
    await form.get('form').trigger('submit')
    await flushPromises()
    expect(form.text()).toContain('Use at least 15 characters.')
    expect(change).not.toHaveBeenCalled()
    await next?.setValue('four plain words here')
    await form.get('form').trigger('submit')
    await flushPromises()
    expect(change).toHaveBeenCalledWith({ current: 'the one before', next: 'four plain words here' })
    expect(next?.element.value).toBe('')
  })

  it('show the server\'s word on a weak PIN at its field', async () => {
    const change = () => Promise.reject(new ApiError(422, 'Choose another.', { code: 'weak_pin', issues: [{ path: 'pin', message: 'Choose another.' }] }))
    const form = await mountSuspended(SessionPin, { props: { hasPin: false, change } })
    const [pin, password] = form.findAll('input')
    await pin?.setValue('123456')
    await password?.setValue('four plain words here')
    await form.get('form').trigger('submit')
    await flushPromises()
    expect(pin?.attributes('aria-invalid')).toBe('true')
    expect(form.text()).toContain('Choose another.')
  })
})
