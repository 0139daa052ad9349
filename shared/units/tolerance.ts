/**
 * Every tolerance and limit of the product that is a matter of accuracy. Each says its unit, why it has its value, and who uses it.
 * None can be set at run time; rounding happens only where a number is shown or written.
 */

/** mm. Girth and other lengths: a thousandth of what any caliper reads, far above float64 noise. Users: geometry lengths, section. */
export const LENGTH_ACCURACY_MM = 1e-6

/** mm². Areas are closed forms; this is what reports may claim. Users: section, its tests. */
export const AREA_ACCURACY_MM2 = 1e-6

/** mm. Points nearer than this are one point: a thousand roundings of a metre, a thousandth of a nanometre. Users: meetings and self-crossings. */
export const MEETING_MM = 1e-9

/** mm. An x that falls back by less than this is rounding, not an undercut: a quarter circle ends upright. Users: isSingleValuedInX. */
export const TURN_BACK_MM = 1e-9

/** mm. Ellipses and cubics made into arcs: below what a cutting machine resolves. Users: offset, DXF, wood face. */
export const CURVE_TO_ARC_MM = 1e-3

/** mm. Greatest distance between a curve and its chords where polygons are needed. Users: polygon work, drawing on screen. */
export const CHORD_ERROR_MM = 1e-3

/** 1/mm. Whole units to a millimetre in polygon work: 10⁻⁵ mm, and sections up to 470 mm still multiply within a double. Users: polygons. */
export const POLYGON_UNITS_PER_MM = 1e5

/** mm. Sides of the smallest enclosing rectangle. Users: smallestEnclosingRectangleOf, blank. */
export const RECTANGLE_ACCURACY_MM = 1e-6

/** mm. Greatest distance between two faces, as told to a person. Users: difference of two issues. */
export const DIFFERENCE_ACCURACY_MM = 1e-4

/** mm. A corrected knife outline as arcs and lines: the wheel cannot follow closer. Users: knife. */
export const KNIFE_OUTLINE_MM = 0.01

/** mm. Straight lines between rows of the knife table leave the outline by no more. Users: knife. */
export const KNIFE_TABLE_MM = 0.05

/** mm. The last end of a free member's curves must be (width, rise) to within this: typed to the micrometre, kept to a thousandth of it. Users: section. */
export const FREE_END_MM = 1e-6

/** rad. A free member's joint turning by less is tangent: a tenth of a degree cannot be seen on wood. Users: section. */
export const FREE_JOINT_RAD = (0.1 * Math.PI) / 180

/** mm. A length this near a whole nanometre is that nanometre: the noise of a sum of doubles is less, no saw knows it. Users: nanometre. */
export const NANOMETRE_SNAP_MM = 1e-9

/** mm. A thousand kilometres: greater lengths are slips, and below it whole nanometres stay safe integers. Users: length, nanometre. */
export const GREATEST_LENGTH_MM = 1e9
