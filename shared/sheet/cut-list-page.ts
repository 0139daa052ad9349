/** The paper of the cut list, A4 upright, and what stays blank round it, mm. */
export const CUT_LIST_PAGE = { widthMm: 210, heightMm: 297 } as const
export const CUT_LIST_MARGIN_MM = { left: 18, right: 12, top: 12, bottom: 20 } as const
export const CUT_LIST_WIDTH_MM = CUT_LIST_PAGE.widthMm - CUT_LIST_MARGIN_MM.left - CUT_LIST_MARGIN_MM.right
