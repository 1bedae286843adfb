/** Path of an arc about (centre, centre), from one angle to another in radians, clockwise from the top. */
export function arcPath(centrePx: number, radiusPx: number, fromRad: number, toRad: number): string {
  const point = (t: number) =>
    `${(centrePx + radiusPx * Math.sin(t)).toFixed(2)} ${(centrePx - radiusPx * Math.cos(t)).toFixed(2)}`;
  return `M${point(fromRad)}A${radiusPx} ${radiusPx} 0 ${toRad - fromRad > Math.PI ? 1 : 0} 1 ${point(toRad)}`;
}
