/** Cuts a mail's text at its web addresses, so that they can be followed; never anything but http and https. */
export function linkParts(text: string): { text: string; href?: string }[] {
  const parts: { text: string; href?: string }[] = []
  let from = 0
  for (const match of text.matchAll(/https?:\/\/[^\s<>"']+/g)) {
    const address = match[0].replace(/[.,;:!?)\]]+$/, '')
    if (match.index > from) parts.push({ text: text.slice(from, match.index) })
    parts.push({ text: address, href: address })
    from = match.index + address.length
  }
  if (from < text.length) parts.push({ text: text.slice(from) })
  return parts
}
