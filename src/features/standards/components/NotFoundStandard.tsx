import { Link } from 'react-router-dom'
import { PageHead } from '@/components/states.tsx'

/** An address that names no standard. */
export function NotFoundStandard() {
  return (
    <PageHead title="No such standard">
      The rules of a standard of that name are not kept here.{' '}
      <Link to="/standards" className="text-link">
        See which are
      </Link>
      .
    </PageHead>
  )
}
