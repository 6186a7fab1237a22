import { QueryTypes } from 'sequelize'
import type { ReadContext } from '../../context'
import { database } from '../../db'
import type { GroupFacts } from './state'

// One row a group with all that decides its state: no query per sign-off, whatever the order's size.
const select = `
  SELECT g.id, g.repair_order_id AS "repairOrderId", g.name, s.component, r.joint_class AS "jointClass",
    r.status AS "revisionStatus", r.shop_value AS "shopValue", r.second_check_required AS "secondCheckRequired",
    g.bolt_count AS "boltCount", coalesce(jsonb_array_length(nullif(r.stages, 'null')), 1) AS "stageCount",
    r.target_nm AS "targetNm", r.lower_nm AS "lowerNm", r.upper_nm AS "upperNm",
    r.target_value AS "targetValue", r.target_unit AS "targetUnit",
    EXISTS (SELECT 1 FROM not_disturbed_marks n WHERE n.shop_id = g.shop_id AND n.fastener_group_id = g.id) AS "notDisturbed",
    (SELECT max(d.log_sequence) FROM disturbances d WHERE d.shop_id = g.shop_id AND d.fastener_group_id = g.id) AS "disturbedSequence",
    (SELECT max(c.log_sequence) FROM concessions c WHERE c.shop_id = g.shop_id AND c.fastener_group_id = g.id) AS "concededSequence",
    coalesce((
      SELECT json_agg(json_build_object(
        'id', o.id, 'sequence', o.log_sequence, 'technicianId', o.technician_id, 'technicianName', o.technician_name,
        'signedAt', o.signed_at, 'verdict', o.verdict, 'exceptions', o.exceptions,
        'voided', EXISTS (SELECT 1 FROM voids v WHERE v.shop_id = o.shop_id AND v.sign_off_id = o.id),
        'superseded', EXISTS (SELECT 1 FROM sign_offs n WHERE n.supersedes_id = o.id),
        'checked', EXISTS (SELECT 1 FROM second_checks k WHERE k.shop_id = o.shop_id AND k.sign_off_id = o.id AND k.passed),
        'covers', (SELECT json_agg(json_build_object('position', p.position, 'stage', p.stage))
          FROM sign_off_readings p WHERE p.shop_id = o.shop_id AND p.sign_off_id = o.id AND p.counts)
      ) ORDER BY o.log_sequence)
      FROM sign_offs o WHERE o.shop_id = g.shop_id AND o.fastener_group_id = g.id), '[]') AS "signOffs"
  FROM fastener_groups g
  JOIN torque_spec_revisions r ON r.id = g.spec_revision_id
  JOIN torque_specs s ON s.id = r.spec_id`

/** The facts of the groups of repair orders, in the order the groups were added. */
export function factsOfOrders(ctx: ReadContext, repairOrderIds: readonly string[]): Promise<GroupFacts[]> {
  return database().query<GroupFacts>(
    `${select} WHERE g.shop_id = $1 AND g.repair_order_id = ANY($2::uuid[]) ORDER BY g.created_at, g.id`,
    { bind: [ctx.shop.id, repairOrderIds], type: QueryTypes.SELECT, transaction: ctx.tx },
  )
}

/** The facts of one group, or undefined. */
export async function factsOfGroup(ctx: ReadContext, groupId: string): Promise<GroupFacts | undefined> {
  const [facts] = await database().query<GroupFacts>(
    `${select} WHERE g.shop_id = $1 AND g.id = $2`,
    { bind: [ctx.shop.id, groupId], type: QueryTypes.SELECT, transaction: ctx.tx },
  )
  return facts
}
