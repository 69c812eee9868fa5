import { bindAttachment } from './attachment.ts'
import { bindArcRecording } from './arc-recording.ts'
import { bindCoupon } from './coupon.ts'
import { bindHeat } from './heat.ts'
import { bindJobJoint } from './job-joint.ts'
import { bindJob } from './job.ts'
import { bindMachine } from './machine.ts'
import { bindPhoto } from './photo.ts'
import { bindProcedureRevision } from './procedure-revision.ts'
import { bindProcedure } from './procedure.ts'
import { bindReleasedDocument } from './released-document.ts'
import { bindSignature } from './signature.ts'
import { bindBead, bindTrial } from './trial.ts'

/** The models of the records, for `bindModels`. */
export const recordBinders = [bindProcedure, bindProcedureRevision, bindCoupon, bindPhoto, bindSignature, bindReleasedDocument, bindJob, bindJobJoint, bindMachine, bindHeat, bindTrial, bindBead, bindAttachment, bindArcRecording]
