import type { Sequelize } from 'sequelize'
import { bindCoupon } from './coupon.ts'
import { bindJobJoint } from './job-joint.ts'
import { bindJob } from './job.ts'
import { bindPhoto } from './photo.ts'
import { bindProcedureRevision } from './procedure-revision.ts'
import { bindProcedure } from './procedure.ts'
import { bindReleasedDocument } from './released-document.ts'
import { bindSignature } from './signature.ts'

/** Binds the models of the records to one connection pool. */
export function bindRecordModels(sequelize: Sequelize): void {
  for (const bind of [bindProcedure, bindProcedureRevision, bindCoupon, bindPhoto, bindSignature, bindReleasedDocument, bindJob, bindJobJoint]) bind(sequelize)
}
