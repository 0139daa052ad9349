import { randomUUID } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { Op } from 'sequelize'
import { pathOf } from '../files/file-store'
import { StoredFile } from '../models/file'
import { Letter, LetterTry } from '../models/letter'
import { now } from '../services/clock'
import { installation } from '../services/installation'
import { noteOrderMailTaken } from '../services/order-mail'
import { inTransaction } from '../services/transaction'
import type { RunningWorker, WorkerSurroundings } from '../services/running-worker'
import { onQueued } from './outbox'
import { smtpSender } from './transport'
import type { Outcome, SendMail } from './transport'

/** A claim lasts this long: a worker that died holding one is forgotten after it, and the letter is tried again. */
const CLAIM_MS = 120_000
/** Letters of other processes are looked for this often. */
const LOOK_MS = 2_000
const FIRST_WAIT_MS = 5_000
const LONGEST_WAIT_MS = 600_000
/** A mail server that has been out of reach this long is a failure to be told. */
const GIVE_UP_MS = 3 * 86_400_000

/** Sends what is due, as long as the server runs. */
export function startMailWorker({ smtpUrl, log }: WorkerSurroundings): RunningWorker {
  const worker = new MailWorker(smtpSender(smtpUrl), log)
  return { stop: () => worker.stop() }
}

class MailWorker {
  private readonly name = randomUUID()
  private readonly timer: NodeJS.Timeout
  private readonly forget: () => void
  private round: Promise<void> | undefined
  private again = false
  private stopped = false

  constructor(
    private readonly send: SendMail,
    private readonly log: WorkerSurroundings['log'],
  ) {
    this.timer = setInterval(() => this.wake(), LOOK_MS)
    this.forget = onQueued(() => this.wake())
    this.wake()
  }

  async stop(): Promise<void> {
    this.stopped = true
    clearInterval(this.timer)
    this.forget()
    await this.round
  }

  private wake(): void {
    if (this.stopped) return
    if (this.round !== undefined) {
      this.again = true
      return
    }
    this.round = this.sendAllDue()
      .catch((error: unknown) =>
        this.log(error, 'the post could not be worked through; it is looked at again'),
      )
      .finally(() => {
        this.round = undefined
        if (!this.again) return
        this.again = false
        this.wake()
      })
  }

  private async sendAllDue(): Promise<void> {
    while (!this.stopped) {
      const letter = await claimNext(this.name)
      if (letter === undefined) return
      const file = await StoredFile.findByPk(letter.rawFileId, { rejectOnEmpty: true })
      const raw = await readFile(pathOf(file.sha256))
      const outcome = await this.send({ from: installation().mailFrom, to: letter.toAddress, raw })
      await enterOutcome(letter, this.name, outcome)
    }
  }
}

/** Takes the letter that has been due longest, by compare-and-set: of several workers one gets it. */
export async function claimNext(worker: string): Promise<Letter | undefined> {
  const at = now()
  const isFree = { [Op.or]: [{ claimedUntil: null }, { claimedUntil: { [Op.lt]: at } }] }
  const due = await Letter.findAll({
    where: { state: ['queued', 'sending'], dueAt: { [Op.lte]: at }, ...isFree },
    order: [['dueAt', 'ASC']],
    limit: 10,
  })
  for (const letter of due) {
    const [claimed] = await Letter.update(
      {
        claimedBy: worker,
        claimedUntil: new Date(at.getTime() + CLAIM_MS),
        state: 'sending',
        tries: letter.tries + 1,
      },
      { where: { id: letter.id, tries: letter.tries, state: ['queued', 'sending'], ...isFree } },
    )
    if (claimed === 1) return Letter.findByPk(letter.id, { rejectOnEmpty: true })
  }
  return undefined
}

async function enterOutcome(letter: Letter, worker: string, outcome: Outcome): Promise<void> {
  await inTransaction(async (tx) => {
    const at = now()
    const held = await Letter.findOne({
      where: { id: letter.id, claimedBy: worker },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    await LetterTry.create(
      { letterId: letter.id, no: letter.tries, at, outcome: outcome.says },
      { transaction: tx },
    )
    if (held === null) return
    await held.update(
      { ...stateAfter(letter, outcome, at), claimedBy: null, claimedUntil: null },
      { transaction: tx },
    )
    if (outcome.kind === 'taken' && letter.aboutType === 'order') await noteOrderMailTaken(tx, letter)
  })
}

function stateAfter(
  letter: Letter,
  outcome: Outcome,
  at: Date,
): Partial<Pick<Letter, 'state' | 'sentAt' | 'dueAt'>> {
  switch (outcome.kind) {
    case 'taken':
      return { state: 'sent', sentAt: at }
    case 'refused':
      return { state: 'failed' }
    case 'later': {
      if (at.getTime() - letter.queuedAt.getTime() > GIVE_UP_MS) return { state: 'failed' }
      const wait = Math.min(LONGEST_WAIT_MS, FIRST_WAIT_MS * 2 ** Math.min(letter.tries - 1, 10))
      return { state: 'queued', dueAt: new Date(at.getTime() + wait) }
    }
  }
}
