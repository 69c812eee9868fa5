import { calibrationRemindersJob } from './calibration-reminders.ts'
import type { Job } from './job.ts'
import { removeFilesJob } from './remove-files.ts'
import { resetRequestJob } from './reset-request.ts'
import { sendMailJob } from './send-mail.ts'

/** Every kind of stored work. A new kind is a file beside this one and a line here. */
export const jobs: readonly Job[] = [sendMailJob, resetRequestJob, removeFilesJob, calibrationRemindersJob]
