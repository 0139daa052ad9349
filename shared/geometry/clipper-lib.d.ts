/** The little of clipper-lib 6.4.2 that polygons.ts uses; the package brings no types. */
declare module 'clipper-lib' {
  export interface IntPoint {
    X: number
    Y: number
  }
  export type IntPath = IntPoint[]
  export type IntPaths = IntPath[]

  export const ClipType: {
    readonly ctIntersection: number
    readonly ctUnion: number
    readonly ctDifference: number
    readonly ctXor: number
  }
  export const PolyType: { readonly ptSubject: number; readonly ptClip: number }
  export const PolyFillType: { readonly pftEvenOdd: number; readonly pftNonZero: number }
  export const JoinType: { readonly jtSquare: number; readonly jtRound: number; readonly jtMiter: number }
  export const EndType: { readonly etClosedPolygon: number }

  export class Clipper {
    StrictlySimple: boolean
    AddPaths(paths: IntPaths, polyType: number, closed: boolean): boolean
    Execute(clipType: number, solution: IntPaths, subjectFill: number, clipFill: number): boolean
    static Area(path: IntPath): number
    static CleanPolygon(path: IntPath, distance: number): IntPath
  }

  export class ClipperOffset {
    constructor(miterLimit: number, arcTolerance: number)
    AddPaths(paths: IntPaths, joinType: number, endType: number): void
    Execute(solution: IntPaths, delta: number): void
  }

  const ClipperLib: {
    readonly ClipType: typeof ClipType
    readonly PolyType: typeof PolyType
    readonly PolyFillType: typeof PolyFillType
    readonly JoinType: typeof JoinType
    readonly EndType: typeof EndType
    readonly Clipper: typeof Clipper
    readonly ClipperOffset: typeof ClipperOffset
  }
  export default ClipperLib
}
