import nodemailer from 'nodemailer'

/** What came of a try: taken by the server, refused for good, or to be tried again. */
export type Outcome =
  | { readonly kind: 'taken'; readonly says: string }
  | { readonly kind: 'refused'; readonly says: string }
  | { readonly kind: 'later'; readonly says: string }

export interface Sending {
  readonly from: string
  readonly to: string
  readonly raw: Buffer
}

export type SendMail = (sending: Sending) => Promise<Outcome>

/** Sends over SMTP to the server of the URL. A server that cannot be reached, or says "not now" (4xx), is tried again. */
export function smtpSender(smtpUrl: string): SendMail {
  const transport = nodemailer.createTransport({
    url: smtpUrl,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  })
  return async ({ from, to, raw }) => {
    try {
      const info = await transport.sendMail({ envelope: { from, to: [to] }, raw })
      return { kind: 'taken', says: info.response }
    } catch (error) {
      if (!(error instanceof Error)) throw error
      const code =
        'responseCode' in error && typeof error.responseCode === 'number' ? error.responseCode : undefined
      return {
        kind: code !== undefined && code >= 500 ? 'refused' : 'later',
        says: error.message.slice(0, 1000),
      }
    }
  }
}
