import { arcFromSweep, cubicFrom, lineFrom, pointFrom, quarterEllipseFrom } from '@shared/geometry'
import type { Path } from '@shared/geometry'

/** A face with every kind of segment: level, hollow, upright, elliptical, free, sloping, round; 66 wide, 15 to 46 high. */
export const EVERY_KIND_FACE: Path = [
  lineFrom(pointFrom(0, 30), pointFrom(4, 30)),
  arcFromSweep(pointFrom(4, 30), pointFrom(16, 42), Math.PI / 2),
  lineFrom(pointFrom(16, 42), pointFrom(16, 46)),
  lineFrom(pointFrom(16, 46), pointFrom(20, 46)),
  quarterEllipseFrom(pointFrom(20, 46), pointFrom(32, 38), 'level'),
  cubicFrom(pointFrom(32, 38), pointFrom(36, 30), pointFrom(40, 44), pointFrom(44, 36)),
  lineFrom(pointFrom(44, 36), pointFrom(56, 25)),
  arcFromSweep(pointFrom(56, 25), pointFrom(66, 15), -Math.PI / 2),
]
