/**
 * The drawing sheet that every document is drawn on: frame, title block and footer strip on each page, a running cursor,
 * sections with bookmarks, and the tags that let a screen reader follow along. All measures in points, y downwards.
 */
import PDFDocument from 'pdfkit'
import { Faces, printable } from './fonts.ts'
import { drawLines, heightOf, leadingOf, setText, widthOf, type Line, type Style } from './text.ts'
import { drawTitleBlock, titleBlockHeight, type TitleBlock } from './title-block.ts'
import { COLOUR } from './tokens.ts'

export type Paper = 'A4' | 'Letter'
type Element = PDFKit.PDFStructureElement

export interface SheetOptions {
  paper: Paper
  titleBlock: TitleBlock
  /** Set in the document's properties; ISO date-time keeps the same record the same bytes. */
  info: { title: string; subject: string; author: string; keywords: string; created: Date }
  /** Left to right at the foot of each page: number, revision and status; the page count is added. */
  identity: string
  footer: { notice: string; caution: string }
}

const MARGIN = 26
const FOOT = 31
export const PAD = 8

export const BODY: Style = { face: 'text', size: 7.8, colour: COLOUR.ink, leading: 10.6 }
export const STRONG: Style = { ...BODY, face: 'strong' }
export const SOFT: Style = { face: 'text', size: 6.8, colour: COLOUR.soft, leading: 9 }
export const LABEL: Style = { face: 'head', size: 7.2, colour: COLOUR.soft, leading: 9, tracking: 0.35 }
export const HEAD: Style = { face: 'headStrong', size: 11, colour: COLOUR.ink, leading: 14, tracking: 0.45 }

export class Sheet {
  readonly doc: PDFKit.PDFDocument
  readonly faces: Faces
  readonly left = MARGIN
  readonly right: number
  readonly width: number
  private readonly frameTop = MARGIN
  private readonly bodyTop: number
  readonly bottom: number
  private readonly frameBottom: number
  y: number
  private readonly root: Element
  private parent: Element
  private running: { title: string; note: string } | null = null
  private readonly chunks: Buffer[] = []

  constructor(private readonly options: SheetOptions) {
    const { info } = options
    const settings = {
      size: options.paper === 'A4' ? 'A4' : 'LETTER',
      margins: { top: 0, bottom: 0, left: 0, right: 0 },
      autoFirstPage: false,
      bufferPages: true,
      tagged: true,
      lang: 'en',
      displayTitle: true,
      pdfVersion: '1.7' as const,
      // No built-in face is wanted; pdfkit's types know only a name here.
      font: null as unknown as string,
      info: { Title: info.title, Subject: info.subject, Author: info.author, Keywords: info.keywords, Creator: 'Sidebend', Producer: 'Sidebend', CreationDate: info.created, ModDate: info.created },
    }
    this.doc = new PDFDocument(settings)
    this.doc.on('data', (chunk: Buffer) => this.chunks.push(chunk))
    this.faces = new Faces(this.doc)
    const [pageWidth, pageHeight] = options.paper === 'A4' ? [595.28, 841.89] : [612, 792]
    this.right = pageWidth - MARGIN
    this.width = this.right - this.left
    this.frameBottom = pageHeight - MARGIN
    this.root = this.doc.struct('Document', { title: info.title, lang: 'en' })
    this.doc.addStructure(this.root)
    this.parent = this.root
    this.doc.addPage()
    this.bodyTop = this.frameTop + titleBlockHeight(this.faces, options.titleBlock, this.width)
    this.bottom = this.frameBottom - FOOT
    this.y = this.bodyTop
  }

  /** Room left on this page. */
  get room(): number {
    return this.bottom - this.y
  }

  /** Height of an empty page below a section head. */
  get fullRoom(): number {
    return this.bottom - this.bodyTop - 20
  }

  newPage(): void {
    this.doc.addPage()
    this.y = this.bodyTop
    if (this.running) this.drawHead(this.running.title, 'continued', false)
  }

  /** Starts a new page unless `height` more points fit. True when it did. */
  ensure(height: number): boolean {
    if (this.room >= height) return false
    this.newPage()
    return true
  }

  /** A section with its bookmark; `keep` is the room below the head without which it starts on a new page. */
  section(title: string, note: string, body: () => void, keep = 60): void {
    if (this.room < keep + 20) {
      this.running = null
      this.newPage()
    }
    const part = this.doc.struct('Sect', { title })
    this.root.add(part)
    this.parent = part
    this.doc.outline.addItem(printable(title))
    this.drawHead(title, note, true)
    this.running = { title, note }
    body()
    this.running = null
    this.parent = this.root
    this.rule(COLOUR.ink, 0.7)
  }

  /** A smaller heading within a section. */
  subhead(title: string, note = '', keep = 34): void {
    this.ensure(keep)
    const style: Style = { ...HEAD, size: 9, leading: 12, tracking: 0.3 }
    this.y += 4
    this.tag('H2', () => drawLines(this.faces, style, setText(this.faces, style, title, this.width - 2 * PAD), this.left + PAD, this.y))
    if (note) {
      const lines = setText(this.faces, SOFT, note, this.width * 0.6)
      this.tag('P', () => drawLines(this.faces, SOFT, lines.slice(0, 1), this.left + PAD, this.y + 1.5, this.width - 2 * PAD, 'right'))
    }
    this.y += 13
    this.rule(COLOUR.rule, 0.5, PAD)
  }

  private drawHead(title: string, note: string, first: boolean): void {
    const height = 18
    this.artifact(() => {
      this.doc.rect(this.left, this.y, this.width, height).fill(COLOUR.band)
      if (this.y > this.bodyTop) this.doc.lineWidth(0.7).strokeColor(COLOUR.ink).moveTo(this.left, this.y).lineTo(this.right, this.y).stroke()
      this.doc.lineWidth(0.5).strokeColor(COLOUR.rule).moveTo(this.left, this.y + height).lineTo(this.right, this.y + height).stroke()
    })
    const lines = setText(this.faces, HEAD, title.toUpperCase(), this.width * 0.7)
    const draw = () => drawLines(this.faces, HEAD, lines.slice(0, 1), this.left + PAD, this.y + 2)
    if (first) this.tag('H1', draw)
    else this.artifact(draw)
    if (note) {
      const used = lines[0]?.width ?? 0
      const noteLines = setText(this.faces, SOFT, note, this.width - 3 * PAD - used)
      const drawNote = () => drawLines(this.faces, SOFT, noteLines.slice(0, 1), this.left + PAD, this.y + 4.8, this.width - 2 * PAD, 'right')
      if (first) this.tag('P', drawNote)
      else this.artifact(drawNote)
    }
    this.y += height
  }

  /** A rule across the sheet at the cursor. */
  rule(colour: string = COLOUR.hair, weight = 0.5, inset = 0): void {
    this.artifact(() => this.doc.lineWidth(weight).strokeColor(colour).moveTo(this.left + inset, this.y).lineTo(this.right - inset, this.y).stroke())
  }

  /** Text over the sheet's width (or `width` from `x`), broken between lines at a page's end. */
  paragraph(text: string, style: Style = BODY, inset = PAD, gap = 3): void {
    const width = this.width - 2 * inset
    let lines: Line[] = setText(this.faces, style, text, width)
    while (lines.length > 0) {
      const fit = Math.floor((this.room - gap) / leadingOf(style))
      if (fit < Math.min(2, lines.length)) {
        this.newPage()
        continue
      }
      const part = lines.slice(0, fit)
      const top = this.y + gap
      this.tag('P', () => drawLines(this.faces, style, part, this.left + inset, top))
      this.y = top + heightOf(part, style)
      lines = lines.slice(fit)
    }
    this.y += gap
  }

  /** A box with a mark on its left edge, for what must not be overlooked; title in words, so that it reads without colour. */
  callout(title: string, text: string, tone: 'oxide' | 'straw' | 'steel'): void {
    const wash = tone === 'oxide' ? COLOUR.oxideWash : tone === 'straw' ? COLOUR.strawWash : COLOUR.band
    const inner = this.width - 2 * PAD - 18
    const head: Style = { ...STRONG, colour: COLOUR[tone] }
    const titleLines = setText(this.faces, head, title, inner)
    let lines = setText(this.faces, BODY, text, inner)
    let shown = titleLines
    while (lines.length > 0) {
      const used = heightOf(shown, head) + 10
      const fit = Math.floor((this.room - used - 8) / leadingOf(BODY))
      if (fit < Math.min(2, lines.length)) {
        this.newPage()
        continue
      }
      const part = lines.slice(0, fit)
      const height = used + heightOf(part, BODY)
      const top = this.y + 4
      this.artifact(() => {
        this.doc.rect(this.left + PAD, top, this.width - 2 * PAD, height).fill(wash)
        this.doc.rect(this.left + PAD, top, 2.5, height).fill(COLOUR[tone])
      })
      this.tag('P', () => {
        drawLines(this.faces, head, shown, this.left + PAD + 10, top + 5)
        drawLines(this.faces, BODY, part, this.left + PAD + 10, top + 5 + heightOf(shown, head))
      })
      this.y = top + height + 4
      lines = lines.slice(fit)
      shown = []
    }
  }

  /** Marks what `draw` paints as content of the given type below the current section (or `into`). */
  tag(type: string, draw: () => void, options: { alt?: string; into?: Element } = {}): void {
    const element = this.doc.struct(type, options.alt ? { alt: printable(options.alt) } : {})
    ;(options.into ?? this.parent).add(element)
    const content = this.doc.markStructureContent(type)
    draw()
    this.doc.endMarkedContent()
    element.add(content)
  }

  /** An element without content of its own, e.g. a table row. */
  group(type: string, into?: Element): Element {
    const element = this.doc.struct(type)
    ;(into ?? this.parent).add(element)
    return element
  }

  /** Lines, washes and page furniture: of no meaning to a reader. */
  artifact(draw: () => void, type?: 'Pagination' | 'Layout'): void {
    this.doc.markContent('Artifact', type ? { type } : undefined)
    draw()
    this.doc.endMarkedContent()
  }

  private furniture(page: number, count: number): void {
    const { doc, faces } = this
    this.artifact(() => {
      drawTitleBlock(doc, faces, this.options.titleBlock, this.left, this.frameTop, this.width, this.bodyTop - this.frameTop)
      const top = this.frameBottom - FOOT
      doc.lineWidth(0.9).strokeColor(COLOUR.ink).rect(this.left, this.frameTop, this.width, this.frameBottom - this.frameTop).stroke()
      doc.rect(this.left + 0.45, top, this.width - 0.9, FOOT - 0.45).fill(COLOUR.white)
      doc.lineWidth(0.7).strokeColor(COLOUR.ink).moveTo(this.left, top).lineTo(this.right, top).stroke()
      const side = 148
      doc.lineWidth(0.5).moveTo(this.right - side, top).lineTo(this.right - side, this.frameBottom).stroke()
      const small: Style = { face: 'text', size: 6, colour: COLOUR.soft, leading: 8 }
      const textWidth = this.width - side - 2 * PAD
      const lines = [...setText(faces, small, this.options.footer.notice, textWidth), ...setText(faces, small, this.options.footer.caution, textWidth)].slice(0, 3)
      drawLines(faces, small, lines, this.left + PAD, top + (FOOT - heightOf(lines, small)) / 2)
      let identity: Style = { face: 'headStrong', size: 9.5, colour: COLOUR.ink, leading: 12 }
      while (identity.size > 5.5 && widthOf(faces, identity, this.options.identity) > side - 2 * PAD) identity = { ...identity, size: identity.size - 0.25 }
      const counted: Style = { face: 'text', size: 7, colour: COLOUR.ink, leading: 9 }
      drawLines(faces, identity, setText(faces, identity, this.options.identity, side - 2 * PAD).slice(0, 1), this.right - side + PAD, top + 4.5, side - 2 * PAD, 'right')
      drawLines(faces, counted, setText(faces, counted, `Page ${page} of ${count}`, side - 2 * PAD), this.right - side + PAD, top + 17, side - 2 * PAD, 'right')
    }, 'Pagination')
  }

  /** Adds frame, title block and page count to every page and gives the finished file. */
  async finish(): Promise<Buffer> {
    const { start, count } = this.doc.bufferedPageRange()
    for (let page = 0; page < count; page += 1) {
      this.doc.switchToPage(start + page)
      this.furniture(page + 1, count)
    }
    this.root.end()
    const done = new Promise<void>((resolve, reject) => {
      this.doc.on('end', resolve)
      this.doc.on('error', reject)
    })
    this.doc.end()
    await done
    return Buffer.concat(this.chunks)
  }
}
