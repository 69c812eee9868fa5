/** Where signed-out people are sent, and how they come back to what they were after. */
const BACK = 'to'

export const signInPath = (from: { pathname: string; search: string }): string => {
  const target = `${from.pathname}${from.search}`
  return target === '/' ? '/sign-in' : `/sign-in?${BACK}=${encodeURIComponent(target)}`
}

/** The page asked for before signing in; only ever a path of this program. */
export function returnPath(search: string): string {
  const target = new URLSearchParams(search).get(BACK) ?? '/'
  return /^\/(?![/\\])/.test(target) ? target : '/'
}
