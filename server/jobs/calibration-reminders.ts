import { z } from 'zod'
import { remindOfCalibrations } from '../services/calibration-reminders.ts'
import { job } from './job.ts'

/** Each morning: tells administrators and engineers which calibrations are due or have lapsed, once for each due date. */
export const calibrationRemindersJob = job({
  name: 'calibration-reminders',
  data: z.object({}),
  schedule: '15 5 * * *',
  run: (services) => remindOfCalibrations(services),
})
