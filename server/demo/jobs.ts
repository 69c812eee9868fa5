/** The demo firm's jobs. `wps` names a procedure whose approved revision the joint is welded by. */
import { writeJobSchema } from '@shared/schemas/records.ts'
import type { Position, Process } from '@shared/schemas/welding.ts'
import type { WriteJob } from '../services/jobs.ts'
import { mm } from './content/parts.ts'

interface JointRow { number: string; mark: string; metal: string; process: Process; thickness: number; position: Position; length: string; count?: number; diameter?: number; wps: string | null }
interface JobRow { title: string; customer: string; code: string; notes?: string; joints: JointRow[] }

const JOBS: readonly JobRow[] = [
  {
    title: 'Settling tank 3', customer: 'Hollin Valley Water', code: 'ASME BPVC Section IX, client specification HVW-12', notes: 'Shell courses first; roof stiffeners in the shop.',
    joints: [
      { number: 'J1', mark: 'Shell course 1, vertical', metal: 'A516-70', process: 'SMAW', thickness: 12, position: '3G', length: '2.4 m', count: 4, wps: 'WPS-001' },
      { number: 'J2', mark: 'Shell course 2, vertical', metal: 'A516-70', process: 'SMAW', thickness: 10, position: '3G', length: '2.4 m', count: 4, wps: 'WPS-001' },
      { number: 'J3', mark: 'Shell girth 1 to 2', metal: 'A516-70', process: 'SMAW', thickness: 10, position: '2G', length: '18.8 m', wps: 'WPS-001' },
      { number: 'J4', mark: 'Floor plate butts', metal: 'A516-70', process: 'SMAW', thickness: 8, position: '1G', length: '3.0 m', count: 6, wps: 'WPS-001' },
      { number: 'J5', mark: 'Reinforcing plate at nozzle N1', metal: 'A516-70', process: 'SMAW', thickness: 25, position: '1G', length: '1.6 m', wps: null },
      { number: 'J6', mark: 'Dosing launder, sheet butts', metal: '304L', process: 'GTAW', thickness: 4, position: '2G', length: '1.2 m', count: 8, wps: 'WPS-004' },
      { number: 'J7', mark: 'Chlorine contact panel', metal: '316L', process: 'GTAW', thickness: 6, position: '3G', length: '0.9 m', count: 12, wps: null },
    ],
  },
  {
    title: 'Pipe rack and spools, north yard', customer: 'Tarnbeck Process', code: 'ASME BPVC Section IX', notes: 'Base plates B1 and B2 by WPS-006, see the reason recorded with it.',
    joints: [
      { number: 'S1', mark: 'Spool 101, butts', metal: 'A106-B', process: 'GTAW', thickness: 11, diameter: 168.3, position: '6G', length: '0.53 m', count: 14, wps: 'WPS-003' },
      { number: 'S2', mark: 'Spool 102, butts', metal: 'A106-B', process: 'GTAW', thickness: 8.2, diameter: 219.1, position: '6G', length: '0.69 m', count: 9, wps: 'WPS-003' },
      { number: 'B1', mark: 'Base plate, column A', metal: 'A36', process: 'GMAW', thickness: 26, position: '1G', length: '0.8 m', count: 2, wps: 'WPS-006' },
      { number: 'B2', mark: 'Beam flange splices', metal: 'A36', process: 'GMAW', thickness: 16, position: '1G', length: '0.3 m', count: 20, wps: 'WPS-002' },
      { number: 'C1', mark: 'Column splices', metal: 'A36', process: 'FCAW', thickness: 14, position: '3G', length: '0.4 m', count: 8, wps: null },
    ],
  },
  {
    title: 'Access platform and handrail, filter hall', customer: 'Hollin Valley Water', code: 'ASME BPVC Section IX, client specification HVW-20',
    joints: [
      { number: 'P1', mark: 'Stringer butts', metal: '6061-T6', process: 'GMAW', thickness: 8, position: '1G', length: '0.25 m', count: 12, wps: 'WPS-005' },
      { number: 'P2', mark: 'Stringer field splices', metal: '6061-T6', process: 'GMAW', thickness: 8, position: '3G', length: '0.25 m', count: 4, wps: 'WPS-005' },
      { number: 'P3', mark: 'Kick plates', metal: '6061-T6', process: 'GMAW', thickness: 5, position: '2G', length: '1.1 m', count: 16, wps: 'WPS-005' },
      { number: 'H1', mark: 'Handrail posts', metal: '6063-T6', process: 'GMAW', thickness: 5, position: '1G', length: '0.15 m', count: 40, wps: null },
      { number: 'H2', mark: 'Splash panels', metal: '5083-O', process: 'GMAW', thickness: 4, position: '1G', length: '1.4 m', count: 6, wps: null },
      { number: 'D1', mark: 'Dosing line brackets', metal: '304L', process: 'GTAW', thickness: 3, position: '1G', length: '0.2 m', count: 10, wps: 'WPS-004' },
    ],
  },
]

/** Jobs as they are saved; `approved` gives the revision of a procedure number. */
export const demoJobs = (approved: (number: string) => string): WriteJob[] =>
  JOBS.map(({ joints, ...job }) =>
    writeJobSchema.parse({
      ...job,
      joints: joints.map(({ metal, thickness, diameter, wps, ...joint }) => ({
        ...joint, metalA: metal, metalB: metal, weld: 'groove', product: diameter === undefined ? 'plate' : 'pipe', thickness: mm(thickness), diameter: diameter === undefined ? null : mm(diameter), revisionId: wps === null ? null : approved(wps),
      })),
    }),
  )
