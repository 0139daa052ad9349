import type { Section } from './document'

/** Thickness of the gesso over a member (from 0), mm; 0 where no stretch covers it. */
export function gessoOver({ gesso }: Section, member: number): number {
  if (typeof gesso === 'number') return gesso
  return gesso.find(({ from, to }) => from <= member && member < to)?.thickness ?? 0
}

/** Whether any of the face is gessoed. */
export function hasGesso({ gesso }: Section): boolean {
  return typeof gesso === 'number' ? gesso > 0 : gesso.some(({ thickness }) => thickness > 0)
}

/** The greatest thickness, mm. */
export function thickestGessoOf({ gesso }: Section): number {
  return typeof gesso === 'number' ? gesso : Math.max(0, ...gesso.map(({ thickness }) => thickness))
}
