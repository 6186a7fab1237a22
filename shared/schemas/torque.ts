/** The bench tools: conversion, band check, wrench setting and tightening order alone. */
import * as z from 'zod/mini'
import { patterns } from '../torque/order'
import { verdicts } from '../torque/verdict'
import { positiveNumber, quantity, torqueUnit } from './common'
import { adapter } from './sign-offs'
import { boltCount, limits, tolerance } from './torque-specs'

export const convertBody = z.strictObject({ value: positiveNumber, unit: torqueUnit, to: torqueUnit })
export const convertAnswer = z.strictObject({ value: z.number(), unit: torqueUnit, nm: z.number() })

/** `entered` and, where it is a bare number, `target` are in `unit`. */
export const checkBody = z.strictObject({
  entered: positiveNumber,
  unit: torqueUnit,
  target: z.optional(z.union([positiveNumber, quantity])),
  tolerance: z.optional(z.nullable(tolerance)),
  uncertaintyPercent: z.optional(z.number().check(z.gte(0), z.lte(100))),
})
export const checkAnswer = z.strictObject({
  nm: z.number(),
  limits,
  verdict: z.enum(verdicts),
  probabilityInBand: z.nullable(z.number()),
})
export const settingBody = z.strictObject({
  target: quantity,
  adapter: z.optional(z.nullable(adapter)),
  multiplierRatio: z.optional(z.number().check(z.gte(1), z.lte(200))),
  graduation: z.optional(quantity),
})
export const settingAnswer = z.strictObject({
  setting: quantity,
  rounded: z.optional(quantity),
  gives: z.strictObject({ value: z.number(), unit: torqueUnit, nm: z.number() }),
})
export const orderBody = z.strictObject({ pattern: z.enum(patterns), count: boltCount })
export const orderAnswer = z.strictObject({ order: z.array(z.int()) })

export type ConvertBody = z.infer<typeof convertBody>
export type CheckBody = z.infer<typeof checkBody>
export type CheckAnswer = z.infer<typeof checkAnswer>
export type SettingBody = z.infer<typeof settingBody>
