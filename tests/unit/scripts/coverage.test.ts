import { expect, it } from 'vitest'
import { branchLines } from '../../../scripts/lib/coverage.mjs'

const branches = (covered: number, total: number) => ({ branches: { covered, total } })

it('sums branches by standard and in all, rounding down, and leaves the rest out', () => {
  expect(branchLines({ total: branches(1, 100), '/p/shared/standards/asme-ix/a.ts': branches(9, 10), '/p/shared/standards/asme-ix/rules/b.ts': branches(10, 10), '/p/shared/standards/rule.ts': branches(0, 0), '/p/shared/units/c.ts': branches(0, 50), '/p/shared/standards/aws-d1-1/d.ts': branches(949, 1000) }, '/p')).toEqual([
    '  asme-ix        95.0 % (19 of 20)',
    '  aws-d1-1       94.9 % (949 of 1000)',
    '  shared by all  100.0 % (0 of 0)',
    'branches of shared/standards: 94.9 % (968 of 1020)',
  ])
})
