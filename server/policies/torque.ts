import { everyone, policy } from './policy'

/** The converter, band check, wrench setting and tightening order keep nothing. */
export const calculate = policy('torque.calculate', everyone)
