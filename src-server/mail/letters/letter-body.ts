/** What every letter has: its plain text and its HTML say the same words. */
export interface LetterBody {
  readonly subject: string
  readonly text: string
  readonly html: string
}

/** A part of a letter, written once and set twice. */
export type LetterPart =
  | { readonly kind: 'paragraph'; readonly text: string }
  | { readonly kind: 'rows'; readonly rows: readonly (readonly [name: string, value: string])[] }
  | { readonly kind: 'list'; readonly items: readonly string[] }
  | { readonly kind: 'link'; readonly says: string; readonly url: string }

/** Sets the parts as plain text and as HTML, so that the two cannot disagree. */
export function letterBodyFrom(subject: string, parts: readonly LetterPart[]): LetterBody {
  return {
    subject,
    text: parts.map(textOf).join('\n\n') + '\n',
    html: `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escaped(subject)}</title></head><body style="font-family:'Work Sans',Arial,sans-serif;font-size:15px;line-height:1.45;color:#26211b">${parts.map(htmlOf).join('')}</body></html>`,
  }
}

function textOf(part: LetterPart): string {
  switch (part.kind) {
    case 'paragraph':
      return part.text
    case 'rows':
      return part.rows.map(([name, value]) => `${name}: ${value}`).join('\n')
    case 'list':
      return part.items.map((item) => `- ${item}`).join('\n')
    case 'link':
      return `${part.says}\n${part.url}`
  }
}

function htmlOf(part: LetterPart): string {
  switch (part.kind) {
    case 'paragraph':
      return `<p>${escaped(part.text).replaceAll('\n', '<br>')}</p>`
    case 'rows':
      return `<table style="border-collapse:collapse">${part.rows
        .map(
          ([name, value]) =>
            `<tr><td style="padding:2px 16px 2px 0;color:#61574a;vertical-align:top">${escaped(name)}:</td><td style="padding:2px 0">${escaped(value)}</td></tr>`,
        )
        .join('')}</table>`
    case 'list':
      return `<ul>${part.items.map((item) => `<li>${escaped(item)}</li>`).join('')}</ul>`
    case 'link':
      return `<p>${escaped(part.says)}<br><a href="${escaped(part.url)}" style="color:#8a3324">${escaped(part.url)}</a></p>`
  }
}

function escaped(text: string): string {
  const names: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  }
  return text.replaceAll(/[&<>"']/g, (sign) => names[sign] ?? sign)
}
