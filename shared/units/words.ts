/** Which words a workshop uses: one setting, never mixed on one screen. */
export type Vocabulary = 'moulding' | 'molding'

interface Forms {
  readonly one: string
  readonly many: string
}

const forms = (one: string, many = `${one}s`): Forms => ({ one, many })

const WORDS = {
  moulding: { moulding: forms('moulding'), molding: forms('molding') },
  mitre: { moulding: forms('mitre'), molding: forms('miter') },
  mitred: { moulding: forms('mitred', 'mitred'), molding: forms('mitered', 'mitered') },
  rebate: { moulding: forms('rebate'), molding: forms('rabbet') },
  timber: { moulding: forms('timber'), molding: forms('lumber', 'lumber') },
  lime: { moulding: forms('lime', 'lime'), molding: forms('basswood', 'basswood') },
  tulipwood: { moulding: forms('tulipwood', 'tulipwood'), molding: forms('yellow-poplar', 'yellow-poplar') },
  length: { moulding: forms('length'), molding: forms('stick') },
  splay: { moulding: forms('splay'), molding: forms('bevel') },
  'cutter-block': { moulding: forms('cutter block'), molding: forms('cutterhead') },
  'cut-list': { moulding: forms('cutting list'), molding: forms('cut list') },
  'first-off': { moulding: forms('first-off'), molding: forms('first piece') },
} as const satisfies Record<string, Record<Vocabulary, Forms>>

export type WordKey = keyof typeof WORDS

export const WORD_KEYS = Object.keys(WORDS) as readonly WordKey[]

export interface WordOptions {
  readonly plural?: boolean
  /** For the start of a sentence or a heading. */
  readonly capital?: boolean
}

/** A trade word as this workshop says it. */
export function wordOf(vocabulary: Vocabulary, key: WordKey, options: WordOptions = {}): string {
  const { one, many } = WORDS[key][vocabulary]
  const word = options.plural ? many : one
  return options.capital ? word.charAt(0).toUpperCase() + word.slice(1) : word
}
