import { readFileSync } from 'node:fs'
import { parse } from 'csv-parse/sync'
import { describe, expect, it } from 'vitest'
import { checkDualUnits } from '#shared/torque/dual-unit'
import { isTorqueUnit, type Quantity } from '#shared/torque/units'

type Row = Record<string, string>

// Values as printed in public US Army technical manuals; each row names its manual and page.
function readTable(name: string): Row[] {
  return parse(readFileSync(new URL(`data/${name}.csv`, import.meta.url)), { columns: true })
}

const joints = readTable('published-joints')
const tables = readTable('published-general-tables')

function quantity(value: string | undefined, unit: string | undefined): Quantity | null {
  return value && isTorqueUnit(unit) ? { value: Number(value), unit } : null
}

/** The printed pairs of a row: value with value, lower with lower, upper with upper. */
function pairsOf(row: Row) {
  const columns = [
    ['target_value', 'printed_value'],
    ['lower_value', 'printed_lower'],
    ['upper_value', 'printed_upper'],
  ]
  return columns.flatMap(([ours = '', theirs = '']) => {
    const first = quantity(row[ours], row.target_unit)
    const second = quantity(row[theirs], row.printed_unit)
    return first && second ? [{ first, second }] : []
  })
}

const flagged = (rows: Row[]) => rows
  .flatMap(pairsOf)
  .filter(pair => !checkDualUnits(pair).explained)
  .map(({ first, second }) => `${first.value} ${first.unit} / ${second.value} ${second.unit}`)

describe('published values in two units', () => {
  it('reads all rows', () => {
    expect(joints).toHaveLength(9)
    expect(tables).toHaveLength(40)
    expect(joints.flatMap(pairsOf)).toHaveLength(11)
    expect(tables.flatMap(pairsOf)).toHaveLength(30)
  })

  it('flags 20/25 and 120/15 of the joints and no other', () => {
    expect(flagged(joints)).toEqual(['20 lbf.ft / 25 N.m', '120 lbf.in / 15 N.m'])
  })

  it('flags 300/408 and 1820/2712 of the general tables and no other', () => {
    expect(flagged(tables)).toEqual(['300 lbf.ft / 408 N.m', '1820 lbf.ft / 2712 N.m'])
  })
})
