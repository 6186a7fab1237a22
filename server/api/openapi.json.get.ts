import { defineEventHandler } from 'h3'
import { describeApi } from '../contract/openapi'

export default defineEventHandler(() => describeApi())
