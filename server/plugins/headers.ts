import { randomBytes } from 'node:crypto'
import { setResponseHeaders } from 'h3'

/** What every answer carries, page or not. */
const always = {
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'same-origin',
  'X-Frame-Options': 'DENY',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
}

/** Nothing but our own files; the page's own inline scripts by a nonce made for that answer. Camera for the bay's scanner. */
const policyWith = (nonce: string) => [
  `default-src 'self'`, `script-src 'self' 'nonce-${nonce}'`, `style-src 'self' 'unsafe-inline'`, `img-src 'self' data: blob:`,
  `font-src 'self'`, `connect-src 'self'`, `object-src 'none'`, `base-uri 'none'`, `form-action 'self'`, `frame-ancestors 'none'`,
].join('; ')

/** Security headers, and the nonce of inline scripts. In development the tools need their own inline scripts and sockets. */
export default defineNitroPlugin((nitro) => {
  nitro.hooks.hook('request', event => setResponseHeaders(event, always))
  if (import.meta.dev) return
  nitro.hooks.hook('render:html', (html, { event }) => {
    const nonce = randomBytes(16).toString('base64')
    const withNonce = (parts: string[]) => parts.map(part => part.replaceAll('<script', `<script nonce="${nonce}"`))
    html.head = withNonce(html.head)
    html.bodyPrepend = withNonce(html.bodyPrepend)
    html.body = withNonce(html.body)
    html.bodyAppend = withNonce(html.bodyAppend)
    setResponseHeaders(event, {
      'Content-Security-Policy': policyWith(nonce),
      'Permissions-Policy': 'camera=(self), microphone=(), geolocation=()',
      'Cache-Control': 'no-store',
    })
  })
})
