/** The little of jsdom that is used here; the package has no types of its own. */
declare module 'jsdom' {
  export class JSDOM {
    constructor(markup: string, options?: { readonly contentType?: string })
    readonly window: { readonly document: Document }
  }
}
