import { MEMBER_KINDS } from '@/board/new-member'
import { memberGlyphOf } from '@/board/member-glyph'

/** The fourteen kinds with their small drawings, which never change. */
const KINDS_WITH_GLYPHS = MEMBER_KINDS.map((kind) => ({ kind, glyph: memberGlyphOf(kind) }))

export const useMemberKinds = () => ({ kinds: KINDS_WITH_GLYPHS })
