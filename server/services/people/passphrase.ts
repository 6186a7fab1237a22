import { randomInt } from 'node:crypto'
import { Hash } from '@adonisjs/hash'
import { Scrypt } from '@adonisjs/hash/drivers/scrypt'

// scrypt 2^17, r 8, p 1 (OWASP's first choice); the default memory limit of Node is too small for it.
const hash = new Hash(new Scrypt({ cost: 131_072, blockSize: 8, parallelization: 1, maxMemory: 167_772_160 }))

// Each hash takes 128 MB and most of a core for a third of a second: two at a time, the rest in turn.
const AT_A_TIME = 2
let running = 0
const waiting: (() => void)[] = []

async function inTurn<Result>(work: () => Promise<Result>): Promise<Result> {
  if (running >= AT_A_TIME) await new Promise<void>(resolve => waiting.push(resolve))
  running += 1
  try {
    return await work()
  } finally {
    running -= 1
    waiting.shift()?.()
  }
}

/** Hashes a passphrase for keeping. */
export const hashPassphrase = (passphrase: string) => inTurn(() => hash.make(passphrase))

/** Whether a passphrase is the one that was hashed. */
export const verifyPassphrase = (hashed: string, passphrase: string) => inTurn(() => hash.verify(hashed, passphrase))

let nobody: Promise<string> | undefined
/** Costs the same time as a real check, for an e-mail that is not known. */
export async function verifyNobody(passphrase: string): Promise<false> {
  nobody ??= hashPassphrase('nobody signs in with this')
  await verifyPassphrase(await nobody, passphrase)
  return false
}

const letters = 'abcdefghjkmnpqrstuvwxyz23456789'
/** A temporary passphrase that can be read over the telephone: five groups of four, 98 bits. */
export const temporaryPassphrase = () =>
  Array.from({ length: 5 }, () => Array.from({ length: 4 }, () => letters[randomInt(letters.length)]).join('')).join('-')
