import { defineEventHandler } from 'h3'
import { notFound } from '../refusal'
import { answerRefusal } from '../utils/answer'

/** Whatever under /api is no route: the same shape as every refusal, not a page. */
export default defineEventHandler(event => answerRefusal(event, notFound('This address')))
