/** Plane geometry: millimetres and radians as plain numbers, y up, counter-clockwise positive. Nothing is flattened unless said. */
export type {
  ArcSegment,
  CubicSegment,
  EllipseSegment,
  LineSegment,
  Outline,
  Path,
  Point,
  Segment,
} from './segment'
export {
  add,
  angleOf,
  between,
  cross,
  directionFrom,
  distance,
  distanceSquared,
  dot,
  isSamePoint,
  leftOf,
  magnitudeOf,
  minus,
  pointFrom,
  rotated,
  scaled,
  unitOf,
  wrappedTurn,
} from './point'
export {
  arcFromBulge,
  arcFromCentre,
  arcFromSweep,
  cubicFrom,
  ellipseFrom,
  lineFrom,
  quarterEllipseFrom,
} from './make'
export type { EllipseShape } from './make'
export { arcGeometryOf, arcLengthOf, radiusOf, sweepOf } from './arc'
export type { ArcGeometry } from './arc'
export {
  bendOf,
  curvatureAt,
  derivativeAt,
  endTangentOf,
  pointAt,
  secondDerivativeAt,
  startTangentOf,
  tangentAt,
} from './evaluate'
export { signedAreaOf } from './area'
export { areaMomentsOf } from './moments'
export type { AreaMoments } from './moments'
export { lengthOf, lineMomentsOf, segmentLengthOf } from './length'
export type { LengthOptions, LineMoments } from './length'
export { boundsOf, extremaOf } from './bounds'
export type { Axis, Bounds } from './bounds'
export { mirrored, movedBy, reversed, reversedSegment, scaledBy, turnedBy } from './edit'
export { cutAt, monotonePiecesOf, parametersAt, pathSplitAtX, splitAt, splitAtX, subSegment } from './split'
export { isSingleValuedInX } from './single-valued'
export { flattened } from './flatten'
export { intersectionsOf } from './intersect'
export type { Meeting } from './intersect'
export { pathIntersectionsOf, selfCrossingsOf } from './crossings'
export type { PathMeeting } from './crossings'
export { nearestOnPath, nearestOnSegment } from './nearest'
export type { NearestOnPath, NearestOnSegment } from './nearest'
export { greatestDistanceBetween } from './greatest-distance'
export type { GreatestDistance } from './greatest-distance'
export { arcsFromCurve } from './biarc'
export { offsetSegment } from './offset'
export {
  differenceOf,
  intersectionOf,
  offsetPolygon,
  polygonAreaOf,
  simplified,
  symmetricDifferenceArea,
  symmetricDifferenceOf,
  unionOf,
} from './polygons'
export type { OffsetPolygonOptions, Polygon } from './polygons'
export { convexHullOf } from './hull'
export { enclosingRectangleAt, extentAlong, smallestEnclosingRectangleOf } from './enclosing-rectangle'
export type { EnclosingRectangle, Extent } from './enclosing-rectangle'
