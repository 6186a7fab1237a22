import { type H3Event, getRequestHeader, getRequestIP } from 'h3'
import { env } from './env'

/** Where a request comes from: its address (a proxy's word only where one is trusted) and the device as it names itself. */
export function clientOf(event: H3Event): { address: string, device: string } {
  return {
    address: getRequestIP(event, { xForwardedFor: env().trustProxy }) ?? 'unknown',
    device: getRequestHeader(event, 'user-agent') ?? 'unknown device',
  }
}
