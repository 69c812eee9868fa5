export interface Attachment {
  name: string
  mediaType: string
  bytes: Buffer
}

export interface Mail {
  from: string
  to: readonly string[]
  subject: string
  text: string
  attachments: readonly Attachment[]
  /** The same for every try, so that a second delivery can be known as one. */
  messageId: string
}

export interface Mailer {
  /** True for the local fake: nothing leaves the machine, mail is read in the outbox. */
  caught: boolean
  /** @throws Error of the mail server, to be tried again */
  send: (mail: Mail) => Promise<void>
  close: () => void
}
