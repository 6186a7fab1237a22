import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import type * as z from 'zod/mini'
import type { appliesTo } from '#shared/schemas/torque-specs'
import type { SpecKind } from '#shared/types/words'
import { key, optional, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { TorqueSpecRevision } from './torque-spec-revision'

/** The identity of a joint that a manual gives a torque for; what it says is in the revisions. */
export class TorqueSpec extends ShopModel<InferAttributes<TorqueSpec>, InferCreationAttributes<TorqueSpec>> {
  declare id: string
  declare kind: SpecKind
  declare component: string
  declare application: string
  declare appliesTo: z.infer<typeof appliesTo> | null
  declare importKey: string | null
  declare createdAt: Date

  declare revisions?: NonAttribute<TorqueSpecRevision[]>
}

export function initTorqueSpec(sequelize: Sequelize) {
  TorqueSpec.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    kind: required(DataTypes.TEXT),
    component: required(DataTypes.TEXT),
    application: required(DataTypes.TEXT),
    appliesTo: optional(DataTypes.JSONB),
    importKey: optional(DataTypes.CHAR(64)),
    createdAt: required(DataTypes.DATE),
  }, shopOptions(sequelize, 'torque_specs'))
}
