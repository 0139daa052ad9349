import { catchMail } from './catch-mail'

/** The demo's stand-in for a mail provider: a process of its own that keeps every letter and sends none on. */
const { LISTEL_SMTP_PORT: port, LISTEL_CAUGHT_MAIL_DIR: folder } = process.env
if (port === undefined || !/^\d{1,5}$/.test(port) || folder === undefined || folder === '') {
  process.stderr.write('The mail catcher needs LISTEL_SMTP_PORT and LISTEL_CAUGHT_MAIL_DIR.\n')
  process.exit(2)
}

const catcher = await catchMail({ folder, port: Number(port) })
const stop = () => void catcher.close().then(() => process.exit(0))
process.once('SIGTERM', stop)
process.once('SIGINT', stop)
