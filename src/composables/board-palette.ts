import type { Palette } from '@/board/scene-palette'

/** The house's colours, read off the page, so that they are named in one place only. */
export function paletteOf(element: Element): Palette {
  const style = getComputedStyle(element)
  const colour = (token: string): string => style.getPropertyValue(`--${token}`).trim()
  return {
    gesso: colour('gesso'),
    gesso2: colour('gesso-2'),
    line: colour('line'),
    ink: colour('ink'),
    ink2: colour('ink-2'),
    bole: colour('bole'),
    boleTint: colour('bole-tint'),
    leaf: colour('leaf'),
    slate: colour('slate'),
    madder: colour('madder'),
  }
}
