/** The demo firm's records in the order in which such a shop would make them. */
import type { ProcedureRevision } from '../models/procedure-revision.ts'
import { databaseDay } from '../services/calibration-reminders.ts'
import { createJob } from '../services/jobs.ts'
import { createMachine } from '../services/machines.ts'
import { recordArc } from './arc-recording.ts'
import { approve, certify, giveBack, reject, rest, revise, submit, weld, withdraw, write, type Firm } from './acts.ts'
import { handrail6063, handrail6063Coupon, hull5083, platform6061, platform6061Coupon } from './content/aluminium.ts'
import { stainless304, stainless304Coupon, stainless316, stainless316Coupon } from './content/stainless.ts'
import { frameD11, frameD11Coupon, gangwayD12, gangwayD12Coupon, skidIso, skidIsoCoupon } from './content/codes.ts'
import { fcawPlate, fcawPlateCoupon, gmawPlate, gmawPlateCoupon, pipe, pipeCoupon, smawPlate, smawPlateCoupon } from './content/steel.ts'
import { recordHeats } from './heats.ts'
import { demoJobs } from './jobs.ts'
import { demoMachines } from './machines.ts'
import { makeTrials } from './trials.ts'

/** Fifteen procedures, eleven coupons, three jobs, three machines, two trials. */
export async function makeRecords(firm: Firm): Promise<void> {
  // M-001 to M-003, which coupons and panels name.
  const machineIds: string[] = []
  await firm.act(async (tenant) => {
    for (const machine of demoMachines(await databaseDay(tenant))) machineIds.push((await createMachine(tenant, machine)).id)
  })
  await recordHeats(firm)

  const approved = new Map<string, string>()
  const release = async (revision: ProcedureRevision, reason: string | null = null): Promise<ProcedureRevision> => {
    const done = await approve(firm, 'marit', await submit(firm, 'ines', revision), reason)
    approved.set(done.number, done.id)
    return done
  }

  // Procedures are numbered as they are begun, WPS-001 to WPS-015; the coupons PQR-001 to PQR-011 likewise.
  const shell = await write(firm, 'ines', smawPlate('Tank shell and floor, A516-70 plate, stick', [5, 16]))
  const flange = await write(firm, 'ines', gmawPlate('Beam flanges, A36 plate, spray wire', [5, 24], 'Flange and web splices on backing.'))
  const spool = await write(firm, 'ines', pipe())
  const dosing = await write(firm, 'ines', stainless304())
  const platform = await write(firm, 'ines', platform6061())
  const basePlate = await write(firm, 'ines', gmawPlate('Base plates 26 mm, A36, spray wire', [12, 26], 'The two base plates of column A only.'))
  const column = await write(firm, 'ines', fcawPlate())
  const handrail = await write(firm, 'tobias', handrail6063())
  const nozzle = await write(firm, 'ines', smawPlate('Reinforcing plates 25 mm, A516-70, stick', [5, 25], { scope: 'Nozzle reinforcement on settling tank 3.' }))
  const contact = await write(firm, 'ines', stainless316())
  const repair = await write(firm, 'ines', smawPlate('Repairs, A36 plate, stick', [5, 20], { metalId: 'us-a36', scope: 'Repairs of the old yard structures.' }))
  const splash = await write(firm, 'tobias', hull5083())
  const rack = await write(firm, 'ines', frameD11())
  const gangway = await write(firm, 'tobias', gangwayD12())
  const skid = await write(firm, 'ines', skidIso())

  const stick = await certify(firm, 'hal', await weld(firm, 'hal', smawPlateCoupon(), { tone: 'steel', seed: 3, layers: 5, tested: true }, shell.id))
  const spray = await certify(firm, 'hal', await weld(firm, 'hal', gmawPlateCoupon(), { tone: 'steel', seed: 5, layers: 4, tested: true }, flange.id))
  const pipeTest = await certify(firm, 'hal', await weld(firm, 'hal', pipeCoupon(), { tone: 'steel', seed: 8, layers: 5, tested: true }, spool.id))
  const purged = await certify(firm, 'sam', await weld(firm, 'hal', stainless304Coupon(), { tone: 'stainless', seed: 13, layers: 3, tested: true }, dosing.id))
  const pulse = await certify(firm, 'hal', await weld(firm, 'hal', platform6061Coupon(), { tone: 'aluminium', seed: 21, layers: 2, tested: true }, platform.id))
  const atLaboratory = await weld(firm, 'sam', handrail6063Coupon(), { tone: 'aluminium', seed: 34, layers: 2, tested: true }, handrail.id)
  await recordArc(firm, 'anya', atLaboratory)
  const onBench = await weld(firm, 'hal', stainless316Coupon(), { tone: 'stainless', seed: 55, layers: 3, tested: false }, contact.id)
  const failed = await weld(firm, 'sam', fcawPlateCoupon(), { tone: 'steel', seed: 89, layers: 3, tested: true, open: true }, column.id)
  await reject(firm, 'sam', failed, 'Side bend S3 opened 6.5 mm at the side wall: slag. The coupon is to be welded again with a wider root.')

  const structural = await certify(firm, 'hal', await weld(firm, 'hal', frameD11Coupon(), { tone: 'steel', seed: 144, layers: 4, tested: true }, rack.id))
  const rails = await certify(firm, 'sam', await weld(firm, 'sam', gangwayD12Coupon(), { tone: 'aluminium', seed: 233, layers: 3, tested: true }, gangway.id))
  const levelTwo = await certify(firm, 'hal', await weld(firm, 'hal', skidIsoCoupon(), { tone: 'steel', seed: 377, layers: 5, tested: true }, skid.id))

  // Revision A for 16 mm, then B for the 20 mm that the same coupon allows.
  const first = await release(await rest(firm, 'ines', shell, [stick]))
  await release(await revise(firm, 'ines', first, (before) => ({ ...smawPlate(before.title, [5, 20]), supportingCoupons: before.supportingCoupons })))
  await release(await rest(firm, 'ines', flange, [spray]))
  await release(await rest(firm, 'ines', spool, [pipeTest]))
  await release(await rest(firm, 'ines', dosing, [purged]))
  await release(await rest(firm, 'ines', platform, [pulse]))
  await release(await rest(firm, 'ines', basePlate, [spray]), 'Tarnbeck Process accepts 26 mm for the two base plates of column A on the 12 mm coupon, letter TP-114 of 20 April 2026. A 20 mm coupon follows.')
  await release(await rest(firm, 'ines', rack, [structural]))
  await release(await rest(firm, 'tobias', gangway, [rails]))
  await release(await rest(firm, 'ines', skid, [levelTwo]))
  const old = await release(await rest(firm, 'ines', repair, [stick]))
  approved.delete(old.number)
  await withdraw(firm, 'marit', old, 'The yard structures are scrapped; nothing is welded by it any more.')

  await giveBack(firm, 'marit', await submit(firm, 'ines', await rest(firm, 'ines', column, [failed])), 'PQR-008 is rejected. Weld it again, then send this back to me.')
  await submit(firm, 'tobias', await rest(firm, 'tobias', handrail, [atLaboratory]))
  await rest(firm, 'ines', nozzle, [stick])
  await rest(firm, 'ines', contact, [onBench])
  await submit(firm, 'tobias', splash)

  for (const job of demoJobs((number) => approved.get(number) ?? '')) await firm.act((tenant) => createJob(tenant, job))
  await makeTrials(firm, machineIds)
}
