/** Signs a demo person in and calls the API as them. */
export async function session(baseUrl: string, who: string) {
  const answer = await fetch(`${baseUrl}/api/auth/sign-in`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ email: `${who}@jamnut.example`, password: 'jamnut-demo-garage' }),
  })
  if (!answer.ok) throw new Error(`The demo ${who} could not sign in: ${answer.status}.`)
  const cookie = answer.headers.getSetCookie()[0]?.split(';')[0] ?? ''
  return async function call<Body>(method: string, path: string, body?: unknown): Promise<Body> {
    const response = await fetch(`${baseUrl}/api${path}`, {
      method,
      headers: { cookie, 'content-type': 'application/json' },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    })
    if (!response.ok) throw new Error(`${method} ${path}: ${response.status} ${await response.text()}`)
    return response.json()
  }
}

export type Call = Awaited<ReturnType<typeof session>>
